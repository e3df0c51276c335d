import { useId, useState, type Ref } from 'react';
import { StyleSheet, TextInput, View, type TextInputProps } from 'react-native';

import { border, color, radius, size, space, type } from '../theme/tokens';
import { describedBy, FieldFrame, fieldIds, type FieldFrameProps } from './FieldFrame';
import { RichInline } from './RichText';
import { Text } from './Text';
import { web } from './webProps';

export interface FieldProps extends FieldFrameProps {
  value: string;
  onChange: (typed: string) => void;
  onLeave?: () => void;
  onSubmit?: () => void;
  unit?: string;
  placeholder?: string;
  inputMode?: TextInputProps['inputMode'];
  autoComplete?: TextInputProps['autoComplete'];
  secret?: boolean;
  maxLength?: number;
  autoFocus?: boolean;
  readOnly?: boolean;
  required?: boolean;
  inputRef?: Ref<TextInput>;
  /** spoken in place of the label, where a formula would be read badly */
  spoken?: string;
  enterKeyHint?: TextInputProps['enterKeyHint'];
}

/** One line of text, 48 high. */
export function Field(props: FieldProps) {
  return <Entry {...props} look="line" />;
}

/** A number read from a spectrum: 64 high, large figures, the unit at the right. `look="small"` for its ±. */
export function NumberField({ look = 'figure', ...props }: FieldProps & { look?: 'figure' | 'small' }) {
  return <Entry inputMode="decimal" {...props} look={look} />;
}

/** Several lines. */
export function TextArea({ lines = 3, ...props }: FieldProps & { lines?: number }) {
  return <Entry {...props} look="area" lines={lines} />;
}

type Look = 'line' | 'figure' | 'small' | 'area';

function Entry({ look, lines, ...props }: FieldProps & { look: Look; lines?: number }) {
  const id = useId();
  const [focused, setFocused] = useState(false);
  const bad = props.error !== undefined;
  return (
    <FieldFrame id={id} {...props}>
      <View style={[styles.box, boxes[look], look === 'area' && lines !== undefined && { minHeight: lines * type.text.lineHeight + space.xl }, focused && styles.focused, bad && styles.bad]}>
        <TextInput
          ref={props.inputRef}
          value={props.value}
          onChangeText={props.onChange}
          onFocus={() => setFocused(true)}
          onBlur={() => { setFocused(false); props.onLeave?.(); }}
          onSubmitEditing={props.onSubmit}
          placeholder={props.placeholder}
          placeholderTextColor={color.muted}
          inputMode={props.inputMode}
          enterKeyHint={props.enterKeyHint}
          autoComplete={props.autoComplete ?? 'off'}
          autoCapitalize={props.inputMode === 'decimal' || props.inputMode === 'email' || props.secret ? 'none' : 'sentences'}
          autoCorrect={look === 'area'}
          spellCheck={look === 'area'}
          secureTextEntry={props.secret}
          maxLength={props.maxLength}
          autoFocus={props.autoFocus}
          readOnly={props.readOnly}
          multiline={look === 'area'}
          numberOfLines={look === 'area' ? lines : undefined}
          aria-label={props.spoken}
          aria-labelledby={props.spoken === undefined ? fieldIds(id).label : undefined}
          {...web({ 'aria-describedby': describedBy(id, props), 'aria-invalid': bad || undefined, 'aria-required': props.required })}
          style={[styles.input, inputs[look], { color: color[look === 'figure' ? 'measured' : 'ink'] }]}
        />
        {props.unit !== undefined && <Text kind="text" tone="muted" noWrap><RichInline text={props.unit} /></Text>}
      </View>
    </FieldFrame>
  );
}

const boxes = StyleSheet.create({
  line: { minHeight: size.touch },
  figure: { minHeight: size.numberField },
  small: { minHeight: size.numberField },
  area: { alignItems: 'flex-start', paddingVertical: space.md },
});
const inputs = StyleSheet.create({
  line: { ...type.text, height: size.touch - 2 },
  figure: { ...type.figure, height: size.numberField - 2 },
  small: { ...type.figureSmall, height: size.numberField - 2 },
  area: { ...type.text, alignSelf: 'stretch' },
});
const noOutline: object = { outlineWidth: 0, outlineStyle: 'none' };
const styles = {
  ...StyleSheet.create({
    box: {
      flexDirection: 'row', alignItems: 'center', gap: space.sm, paddingHorizontal: space.md, borderWidth: border.hair, borderColor: color.edge,
      borderRadius: radius.control, backgroundColor: color.field,
    },
    focused: { borderColor: color.measured, boxShadow: `0 0 0 1px ${color.measured}` },
    bad: { borderColor: color.error, boxShadow: `0 0 0 1px ${color.error}` },
  }),
  input: [StyleSheet.create({ base: { flex: 1, minWidth: 0, padding: 0 } }).base, noOutline],
};
