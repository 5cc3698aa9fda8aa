/** Why a socket is closed. y-websocket clients try again after any but 4400 to 4499. */
export const CLOSE = {
  goingAway: 1001,
  notBinary: 1003,
  garbage: 1007,
  tryLater: 1013,
  notSignedIn: 4401,
  notAllowed: 4403,
  noSuchSheet: 4404,
} as const;
export type CloseCode = (typeof CLOSE)[keyof typeof CLOSE];
