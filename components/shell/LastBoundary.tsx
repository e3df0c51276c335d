import type { ErrorBoundaryProps } from 'expo-router';

import { uiText } from '@/shared/text/ui';

import { Button } from '../ui/Button';
import { Screen } from '../ui/Screen';
import { ScreenState } from '../ui/ScreenState';

/** A script that did not arrive: after a renewal of the server the old names are gone, so only a reload helps. */
const isMissingChunk = (error: Error) => /loading module|dynamically imported|chunk|failed to fetch|load failed/i.test(`${error.name} ${error.message}`);

/** Stands in for a screen that threw; the frame around it stays. */
export function LastBoundary({ error, retry }: ErrorBoundaryProps) {
  const missing = isMissingChunk(error);
  const title = missing ? uiText.chunkTitle : uiText.brokenTitle;
  return (
    <Screen title={title}>
      <ScreenState kind="error" title={title} hint={missing ? uiText.chunkHint : uiText.brokenHint} action={
        <>
          <Button kind="primary" label={uiText.reload} onPress={() => window.location.reload()} />
          {!missing && <Button label={uiText.tryAgain} onPress={() => void retry()} />}
        </>
      } />
    </Screen>
  );
}
