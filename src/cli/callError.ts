/** The call itself is wrong, or a description named in it cannot be read: exit code 2. */
export class CallError extends Error {}
