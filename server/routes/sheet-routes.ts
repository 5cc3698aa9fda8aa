import { operatingPointBody } from '#shared/api/operating-point';
import { changeSheetBody, createSheetBody } from '#shared/api/sheets';
import { parseBody } from '../http/parse';
import type { Route } from '../http/route';
import { changeSheet } from '../services/change-sheet';
import type { Context } from '../services/context';
import { createSheet } from '../services/create-sheet';
import { deleteSheet } from '../services/delete-sheet';
import { getSheet } from '../services/get-sheet';
import { listSheets } from '../services/list-sheets';
import { liveCircuit } from '../services/live-circuit';
import { liveOperatingPoint } from '../services/live-operating-point';

export function sheetRoutes(ctx: Context): Route[] {
  return [
    {
      method: 'get',
      path: '/api/teams/:teamId/sheets',
      access: 'signed-in',
      perMinute: 600,
      handle: async ({ param, signedIn: { person } }) => ({
        status: 200,
        body: { sheets: await listSheets(ctx, param('teamId'), person.id) },
      }),
    },
    {
      method: 'post',
      path: '/api/teams/:teamId/sheets',
      access: 'signed-in',
      perMinute: 240,
      handle: ({ param, body, signedIn: { person } }) => ({
        status: 201,
        body: createSheet(ctx, param('teamId'), parseBody(createSheetBody, body), person.id),
      }),
    },
    {
      method: 'get',
      path: '/api/sheets/:sheetId',
      access: 'signed-in',
      handle: ({ param, signedIn: { person } }) => ({
        status: 200,
        body: getSheet(ctx, param('sheetId'), person.id),
      }),
    },
    {
      method: 'patch',
      path: '/api/sheets/:sheetId',
      access: 'signed-in',
      handle: ({ param, body, signedIn: { person } }) => ({
        status: 200,
        body: changeSheet(ctx, param('sheetId'), parseBody(changeSheetBody, body), person.id),
      }),
    },
    {
      method: 'delete',
      path: '/api/sheets/:sheetId',
      access: 'signed-in',
      handle: ({ param, signedIn: { person } }) => {
        deleteSheet(ctx, param('sheetId'), person.id);
        return { status: 204 };
      },
    },
    {
      method: 'get',
      path: '/api/sheets/:sheetId/circuit',
      access: 'signed-in',
      perMinute: 600,
      handle: ({ param, signedIn: { person } }) => ({
        status: 200,
        body: liveCircuit(ctx, param('sheetId'), person.id),
      }),
    },
    {
      method: 'get',
      path: '/api/sheets/:sheetId/operating-point',
      access: 'signed-in',
      perMinute: 600,
      handle: async ({ param, signedIn: { person } }) => ({
        status: 200,
        body: await liveOperatingPoint(ctx, param('sheetId'), person.id),
      }),
    },
    {
      method: 'post',
      path: '/api/operating-point',
      access: 'signed-in',
      perMinute: 600,
      handle: async ({ body, signedIn: { person } }) => {
        const record = await ctx.solving.operatingPoint(parseBody(operatingPointBody, body).circuit, person.id);
        return { status: record.status === 'invalid' ? 422 : 200, body: record };
      },
    },
  ];
}
