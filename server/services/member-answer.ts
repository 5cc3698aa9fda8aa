import type { Member } from '#shared/api/members';
import type { MemberRow } from '../db/queries/teams';

export function memberAnswerOf(row: MemberRow): Member {
  return { ...row, joinedAt: new Date(row.joinedAt).toISOString() };
}
