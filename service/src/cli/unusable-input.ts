/** Something given to a command cannot be used. The message says what, and how to mend it. */
export class UnusableInput extends Error {}
