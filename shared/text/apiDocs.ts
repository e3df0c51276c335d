/** Words of the page that describes the API. */
export const apiDocsText = {
  title: 'Throughbond: the API',
  intro: 'Every address the server answers, made from the same schemas that check each request. An error always comes as application/problem+json with one sentence in "detail" and, for fields, their pointers in "errors".',
  machine: 'The same as OpenAPI 3.1:',
  changing: 'A request that changes something is sent as application/json (a file as application/octet-stream) from this site. Signing in sets the cookie tb.sid.',
  access: {
    none: 'Anybody; no session is read.',
    optional: 'Anybody; more for who is signed in.',
    person: 'Signed in; the project decides what more.',
    administrator: 'Site administrators.',
  },
  address: 'In the address',
  query: 'After the question mark',
  body: 'Sends',
  bytes: (limit: string) => `Sends the bytes of a file, at most ${limit}.`,
  answers: 'Answers',
  file: (type: string) => `Answers ${type}.`,
  problem: 'Every error',
} as const;
