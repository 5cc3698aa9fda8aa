import { expect } from 'vitest';
import type { Role } from '#shared/access/roles';
import { meAnswer, personAnswer } from '#shared/api/accounts';
import { errorAnswer } from '#shared/api/errors';
import { invitationAnswer } from '#shared/api/invitations';
import { sheetAnswer } from '#shared/api/sheets';
import type { Running } from '../../../server/start';

export interface Reply {
  readonly status: number;
  readonly headers: Headers;
  readonly body: unknown;
}

type Server = Pick<Running, 'url' | 'port'>;

export const PASSWORD = 'tidal-gauge-417';

/** Someone with a browser: keeps the cookie and sends the headers that a page of the server's own would. */
export class Visitor {
  private readonly server: Server;
  cookie: string | undefined;
  personId = '';

  constructor(server: Server) {
    this.server = server;
  }

  async send(method: string, path: string, body?: unknown, headers: Record<string, string> = {}): Promise<Reply> {
    const response = await fetch(`http://127.0.0.1:${this.server.port}${path}`, {
      method,
      redirect: 'manual',
      headers: {
        origin: this.server.url,
        ...(this.cookie !== undefined && { cookie: this.cookie }),
        ...(body !== undefined && { 'content-type': 'application/json' }),
        ...headers,
      },
      ...(body !== undefined && { body: typeof body === 'string' ? body : JSON.stringify(body) }),
    });
    for (const cookie of response.headers.getSetCookie()) {
      const pair = cookie.split(';')[0] ?? '';
      this.cookie = pair.endsWith('=') ? undefined : pair;
    }
    const text = await response.text();
    const json = response.headers.get('content-type')?.startsWith('application/json');
    return { status: response.status, headers: response.headers, body: json ? JSON.parse(text) : text };
  }

  get = (path: string) => this.send('GET', path);
  post = (path: string, body?: unknown) => this.send('POST', path, body);
  patch = (path: string, body: unknown) => this.send('PATCH', path, body);
  delete = (path: string) => this.send('DELETE', path);

  async signUp(name: string, invitation?: string): Promise<this> {
    const email = `${name.toLowerCase().replaceAll(' ', '.')}@buoy.example`;
    const reply = await this.post('/api/sign-up', { name, email, password: PASSWORD, invitation });
    expect(reply.status, JSON.stringify(reply.body)).toBe(201);
    this.personId = personAnswer.parse(reply.body).person.id;
    return this;
  }

  async signIn(name: string, password = PASSWORD): Promise<Reply> {
    return this.post('/api/sign-in', { email: `${name.toLowerCase().replaceAll(' ', '.')}@buoy.example`, password });
  }

  /** The id of the first of one's teams. */
  async teamId(): Promise<string> {
    const { teams } = meAnswer.parse((await this.get('/api/me')).body);
    return teams[0]?.id ?? '';
  }

  /** Makes an invitation and gives the token of its link. */
  async invite(teamId: string, role: Role, email?: string): Promise<string> {
    const reply = await this.post(`/api/teams/${teamId}/invitations`, { role, email });
    expect(reply.status, JSON.stringify(reply.body)).toBe(201);
    return invitationAnswer.parse(reply.body).link.split('/').at(-1) ?? '';
  }

  async createSheet(teamId: string, more: { starter?: string; circuit?: unknown } = {}): Promise<string> {
    const reply = await this.post(`/api/teams/${teamId}/sheets`, { name: 'Input pair', ...more });
    expect(reply.status, JSON.stringify(reply.body)).toBe(201);
    return sheetAnswer.parse(reply.body).sheet.id;
  }
}

/** The code of an error answer, once its shape has been checked. */
export function codeOf(reply: Reply): string {
  return errorAnswer.parse(reply.body).error.code;
}

export function fieldsOf(reply: Reply): Record<string, string> {
  return errorAnswer.parse(reply.body).error.fields ?? {};
}

/** A team with one person of each role, and somebody who is not in it. */
export async function assembleTeam(server: Server) {
  const owner = await new Visitor(server).signUp('Ines Rautio');
  const teamId = await owner.teamId();
  const join = async (name: string, role: Role) => new Visitor(server).signUp(name, await owner.invite(teamId, role));
  const designer = await join('Samir Kade', 'designer');
  const reviewer = await join('Tove Bakken', 'reviewer');
  const viewer = await join('Runa Leclerc', 'viewer');
  const outsider = await new Visitor(server).signUp('Odd Utne');
  return { teamId, owner, designer, reviewer, viewer, outsider };
}
