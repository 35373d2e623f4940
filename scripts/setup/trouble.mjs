/**
 * Something the person at the terminal can act on: the message says what happened, what was kept and what to do,
 * and is printed without a stack trace.
 */
export class Trouble extends Error {}
