import type { ReactNode } from 'react';
import { StyleSheet, Text } from 'react-native';

/** Read aloud, not drawn. */
export function VisuallyHidden({ children, id }: { children: ReactNode; id?: string }) {
  return <Text id={id} style={styles.hidden}>{children}</Text>;
}

const clip: object = { clip: 'rect(0 0 0 0)', whiteSpace: 'nowrap' };
const styles = { hidden: [StyleSheet.create({ box: { position: 'absolute', width: 1, height: 1, overflow: 'hidden', margin: -1 } }).box, clip] };
