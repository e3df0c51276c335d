import { useState } from 'react';
import { StyleSheet, View } from 'react-native';

import { uiAccount } from '@/shared/text/uiAccount';

import { space } from '../theme/tokens';
import { Button } from '../ui/Button';
import { Field, type FieldProps } from '../ui/Field';

/** A password with a way to see it; pasting is allowed and the browser's own keeper may fill it. */
export function PasswordField({ purpose, ...field }: Omit<FieldProps, 'secret' | 'autoComplete'> & { purpose: 'present' | 'new' }) {
  const [shown, setShown] = useState(false);
  return (
    <View style={styles.row}>
      <View style={styles.field}>
        <Field {...field} secret={!shown} autoComplete={purpose === 'new' ? 'new-password' : 'current-password'} />
      </View>
      <View style={styles.show}>
        <Button label={shown ? uiAccount.hide : uiAccount.show} about={field.label} pressed={shown} onPress={() => setShown(!shown)} />
      </View>
    </View>
  );
}

const styles = StyleSheet.create({
  row: { flexDirection: 'row', gap: space.sm, alignItems: 'flex-start' },
  field: { flex: 1, minWidth: 0 },
  // beside the box, not beside the label: label 16 and gap 4
  show: { paddingTop: 20 },
});
