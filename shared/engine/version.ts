/** Part of every answer: raised whenever the same input may give another digit or word. */
export const ENGINE_VERSION = '1.0.0';
