import { unreadableProblem } from './problems';

/** The contracts and their library arrive with the first screen that needs them; the quick look never does. */
type Responses = (typeof import('./contracts'))['responses'];
export type ContractName = keyof Responses;
export type Answer<Name extends ContractName> = import('zod').infer<Responses[Name]>;

export async function parse<Name extends ContractName>(name: Name, json: unknown): Promise<Answer<Name>> {
  const { responses, readAs } = await import('./contracts');
  const read = readAs(responses[name], json);
  if (!read.ok) throw unreadableProblem();
  return read.value as Answer<Name>;
}
