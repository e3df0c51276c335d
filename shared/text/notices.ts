/** Letters about cases. The number and the question are told; readings and answers stay on the server. */
export interface Notice {
  subject: string;
  lines: string[];
}
interface About {
  code: string;
  question: string;
}

const subject = ({ code, question }: About, what: string): string => `${code} ${what}: ${question}`.slice(0, 180);

export const noticesText = {
  letter: (name: string, lines: readonly string[], link: string): string =>
    [`Dear ${name},`, '', ...lines, '', link, '', 'Throughbond sends this because you are a member of the project.'].join('\n'),
  submitted: (about: About, by: string, dueOn: string | null): Notice => ({
    subject: subject(about, 'waits for review'), lines: [`${by} sent ${about.code} to review: ${about.question}`, ...(dueOn === null ? [] : [`It is due on ${dueOn}.`])],
  }),
  queryOpened: (about: About, by: string): Notice => ({ subject: subject(about, 'has a query'), lines: [`${by} opened a query at ${about.code}: ${about.question}`] }),
  queryAnswered: (about: About, by: string): Notice => ({ subject: subject(about, 'query answered'), lines: [`${by} wrote in a query of ${about.code}: ${about.question}`] }),
  signed: (about: About, by: string): Notice => ({ subject: subject(about, 'is signed'), lines: [`${by} signed ${about.code}: ${about.question}`] }),
  released: (about: About, by: string): Notice => ({ subject: subject(about, 'is free for review again'), lines: [`${by} released your claim on ${about.code}: ${about.question}`] }),
  commented: (about: About, by: string): Notice => ({ subject: subject(about, 'has a comment'), lines: [`${by} wrote a comment at ${about.code}: ${about.question}`] }),
} as const;
