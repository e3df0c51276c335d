import { StyleSheet, View } from 'react-native';

import { border, color, radius, space } from '../theme/tokens';
import { Text } from '../ui/Text';

/** Heights of the drawings: the boxes have them before the drawing has come, so that nothing shifts. */
export const PLOT_HEIGHT = { single: 834, curve: 236, ladder: 300 } as const;

/** The place of the plots while their part of the program is on its way, or when it did not come. */
export function PlotBox({ bond, note, height }: { bond: 'single' | 'double'; note: string; height?: number }) {
  return (
    <View role="status" style={[styles.box, { minHeight: height ?? PLOT_HEIGHT[bond === 'single' ? 'single' : 'ladder'] }]}>
      <Text kind="small" tone="muted">{note}</Text>
    </View>
  );
}

const styles = StyleSheet.create({
  box: { backgroundColor: color.card, borderWidth: border.hair, borderColor: color.rule, borderRadius: radius.card, padding: space.lg, justifyContent: 'center', alignItems: 'center' },
});
