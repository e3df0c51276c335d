import { uiText } from '@/shared/text/ui';

import { LinkButton } from '../ui/LinkButton';
import { Screen } from '../ui/Screen';
import { ScreenState } from '../ui/ScreenState';

export function NotFoundScreen() {
  return (
    <Screen title={uiText.notFoundTitle}>
      <ScreenState kind="empty" title={uiText.notFoundTitle} hint={uiText.notFoundHint} action={<LinkButton kind="primary" href="/" label={uiText.toQuickLook} />} />
    </Screen>
  );
}
