import { usePathname } from 'expo-router';

import { momentWords } from '@/shared/format/when';
import { uiText } from '@/shared/text/ui';

import { useConnectionWatch } from '../data/connection';
import { useSession } from '../data/session';
import { useSessionEnded } from '../data/sessionEnd';
import { LinkButton } from '../ui/LinkButton';
import { NoticeStrip } from '../ui/Notice';
import { herePath, signInPath } from './places';

/** What concerns every screen, at the top over the full width: connection, an ended session, the demonstration. */
export function Strips() {
  const connection = useConnectionWatch();
  const { data } = useSession();
  const ended = useSessionEnded();
  const signingIn = usePathname() === '/sign-in';
  return (
    <>
      {connection.state === 'offline' && <NoticeStrip text={uiText.offline(momentWords(connection.since.toISOString(), connection.since))} />}
      {connection.state === 'back' && <NoticeStrip tone="plain" text={uiText.backOnline} />}
      {ended && !data?.user && !signingIn && (
        <NoticeStrip text={uiText.signedOut} action={<LinkButton small href={signInPath(herePath())} label={uiText.signIn} />} />
      )}
      {data?.demo && <NoticeStrip slim text={uiText.demo} />}
    </>
  );
}
