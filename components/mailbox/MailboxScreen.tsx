import { momentWords } from '@/shared/format/when';
import { uiAccount } from '@/shared/text/uiAccount';

import { asPath } from '../auth/safePath';
import { useMailbox } from '../data/mailbox';
import { LoadProblem } from '../forms/ProblemNotice';
import { Card } from '../ui/Card';
import { LinkButton } from '../ui/LinkButton';
import { RichText } from '../ui/RichText';
import { Screen, Stack } from '../ui/Screen';
import { ScreenState } from '../ui/ScreenState';
import { Text } from '../ui/Text';

const say = uiAccount.mailbox;

/** The mail that the demo's server did not send: shown to whoever tries the demo. */
export function MailboxScreen() {
  const { data, error, isFetching, refetch } = useMailbox();
  return (
    <Screen title={say.title}>
      <Stack>
        {!error?.is('not-found') && <RichText text={say.lead} tone="muted" />}
        {data === undefined && error === null && <ScreenState kind="loading" title={say.loading} />}
        {data === undefined && error !== null && (error.is('not-found')
          ? <ScreenState kind="empty" title={say.off} hint={say.offHint} />
          : <LoadProblem problem={error} again={() => void refetch()} isTrying={isFetching} />)}
        {data?.messages.length === 0 && <ScreenState kind="empty" title={say.empty} hint={say.emptyHint} />}
        {data?.messages.map((message) => (
          <Card key={message.id} title={message.subject} aside={momentWords(message.at, new Date())}>
            <Stack gap="sm">
              <Text kind="small" tone="muted">{say.to(message.to)}</Text>
              {message.text.split(/\n{2,}/).map((paragraph, at) => <Text key={at}>{paragraph}</Text>)}
              {message.link !== null && <LinkButton href={asPath(localPath(message.link))} label={say.open} />}
            </Stack>
          </Card>
        ))}
      </Stack>
    </Screen>
  );
}

/** The mail's link is written for the outside; here only its path counts. */
function localPath(link: string): string {
  try { const url = new URL(link, window.location.origin); return `${url.pathname}${url.search}`; } catch { return '/'; }
}
