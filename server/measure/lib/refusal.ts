/** A command that cannot go on for a reason the person can mend; printed as one sentence, without a stack. */
export class Refusal extends Error {}
