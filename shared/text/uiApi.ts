/** What is said when a request came to nothing before the server could say it. */
export const apiText = {
  offlineTitle: 'No connection',
  offline: 'The server is not reached; what you typed stays here. Try again when there is a connection.',
  timeoutTitle: 'No answer in time',
  timeout: 'The server did not answer in time; nothing is known to be saved. Try again.',
  unreadableTitle: 'Not readable',
  unreadable: 'The answer of the server is not readable here; reload the page and try again.',
  olderPage: 'This page is older than the server: reload it.',
} as const;
