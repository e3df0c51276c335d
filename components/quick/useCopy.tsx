import { useState, type ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';

import { quickText } from '@/shared/text/quick';

import { space } from '../theme/tokens';
import { TextArea } from '../ui/Field';
import { LiveRegion } from '../ui/LiveRegion';
import { Sheet } from '../ui/Sheet';
import { copyToClipboard } from './copyText';

/** Copies, says so, and shows the text to be copied by hand where the browser does not let us. */
export function useCopy(): { copy: (text: string) => void; copied: boolean; part: ReactNode } {
  const [byHand, setByHand] = useState<string | null>(null);
  const [copied, setCopied] = useState(false);
  const copy = (text: string) => {
    void copyToClipboard(text).then((done) => {
      if (!done) return setByHand(text);
      setCopied(true);
      setTimeout(() => setCopied(false), 2_500);
    });
  };
  const part = (
    <>
      <LiveRegion message={copied ? quickText.copied : ''} restMs={0} />
      {byHand !== null && (
        <Sheet title={quickText.copyTitle} onClose={() => setByHand(null)}>
          <View style={styles.body}><TextArea label={quickText.copyFailed} value={byHand} onChange={() => undefined} readOnly lines={10} /></View>
        </Sheet>
      )}
    </>
  );
  return { copy, copied, part };
}

const styles = StyleSheet.create({ body: { paddingHorizontal: space.lg } });
