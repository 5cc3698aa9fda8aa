import { expect, vi } from 'vitest';
import { type ListedSheet, sheetsAnswer } from '#shared/api/sheets';
import type { Visitor } from './visitor';

/** A team's list, once every sheet in it has been solved. */
export async function solvedList(visitor: Visitor, teamId: string): Promise<ListedSheet[]> {
  return vi.waitFor(
    async () => {
      const { sheets } = sheetsAnswer.parse((await visitor.get(`/api/teams/${teamId}/sheets`)).body);
      expect(sheets.map(({ standing }) => standing)).not.toContain(null);
      return sheets;
    },
    { timeout: 20_000 },
  );
}
