import { uiCases } from '@/shared/text/uiCases';
import { uiAccount } from '@/shared/text/uiAccount';

import { signInPath } from '../shell/places';
import { LinkButton } from '../ui/LinkButton';
import { ScreenState } from '../ui/ScreenState';

/** A screen that needs an account, seen without one: says why and leads there and back. */
export function SignInState({ from, title = uiCases.list.signInTitle, hint = uiCases.list.signInHint }: { from: string; title?: string; hint?: string }) {
  return (
    <ScreenState kind="empty" title={title} hint={hint} action={
      <>
        <LinkButton kind="primary" href={signInPath(from)} label={uiAccount.signIn.act} />
        <LinkButton href="/" label={uiAccount.signIn.quickLook} />
      </>
    } />
  );
}
