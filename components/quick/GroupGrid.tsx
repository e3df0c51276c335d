import { useState } from 'react';
import { Pressable, StyleSheet, View } from 'react-native';

import { GROUP_PRESETS } from '@/shared/engine/groups/presets';
import { LIMITS } from '@/shared/limits';
import { quickText } from '@/shared/text/quick';
import type { GroupText } from '@/shared/types/group';

import { border, color, radius, size, space } from '../theme/tokens';
import { Button } from '../ui/Button';
import { Disclosure } from '../ui/Disclosure';
import { Field } from '../ui/Field';
import { RichInline } from '../ui/RichText';
import { Text } from '../ui/Text';
import { web } from '../ui/webProps';

/** The common groups as buttons, and a line for any other. Used for both kinds of bond, in a quick look and in a case. */
export function GroupGrid({ label, value, onPick }: { label: string; value: GroupText; onPick: (group: GroupText) => void }) {
  const isPreset = value === '' || GROUP_PRESETS.some((preset) => preset.text === value);
  const [own, setOwn] = useState(isPreset ? '' : value);
  return (
    <View>
      <View role="group" aria-label={label} style={styles.grid}>
        {GROUP_PRESETS.map((preset) => {
          const on = preset.text === value;
          return (
            <Pressable key={preset.id} role="button" onPress={() => onPick(preset.text)} {...web({ 'aria-pressed': on })} style={[styles.item, on && styles.on]}>
              <Text kind="strong" tone={on ? 'onInk' : 'ink'} align="center">
                {preset.sublabel === '' ? preset.label : <RichInline text={preset.sublabel} />}
              </Text>
            </Pressable>
          );
        })}
      </View>
      <Disclosure label={quickText.ownGroup} startOpen={!isPreset}>
        <View style={styles.own}>
          <Field label={quickText.ownGroup} value={own} onChange={setOwn} maxLength={LIMITS.groupText} hint={quickText.ownGroupHint} onSubmit={() => own.trim() !== '' && onPick(own.trim())} />
          <Button label={quickText.useGroup} onPress={() => own.trim() !== '' && onPick(own.trim())} />
        </View>
      </Disclosure>
    </View>
  );
}

const styles = StyleSheet.create({
  grid: { flexDirection: 'row', flexWrap: 'wrap', gap: space.sm, paddingHorizontal: space.lg, paddingBottom: space.md },
  item: {
    minHeight: size.touch, minWidth: 76, flexGrow: 1, alignItems: 'center', justifyContent: 'center', paddingHorizontal: space.sm, borderWidth: border.hair,
    borderColor: color.edge, borderRadius: radius.control, backgroundColor: color.card,
  },
  on: { backgroundColor: color.ink, borderColor: color.ink },
  own: { paddingHorizontal: space.lg, paddingBottom: space.lg, gap: space.md },
});
