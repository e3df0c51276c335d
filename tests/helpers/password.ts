/** The password of everybody in the tests. */
export const PASSWORD = 'seven bonds apart';
