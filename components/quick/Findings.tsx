import { memo } from 'react';
import { StyleSheet, View } from 'react-native';

import { quickText } from '@/shared/text/quick';
import type { Caution, NextMeasurement } from '@/shared/types/answer';
import type { TrailStep } from '@/shared/types/trail';

import { border, color, space } from '../theme/tokens';
import { Card } from '../ui/Card';
import { Disclosure } from '../ui/Disclosure';
import { CautionIcon } from '../ui/Glyph';
import { Heading } from '../ui/Heading';
import { Mark } from '../ui/Mark';
import { RichText } from '../ui/RichText';
import { Text } from '../ui/Text';

/** What to measure or check, in order; numbered when the order matters. */
export const Plan = memo(function Plan({ title, items, numbered = false }: { title: string; items: readonly NextMeasurement[]; numbered?: boolean }) {
  if (items.length === 0) return null;
  return (
    <Card title={title} flush>
      <View role="list">
        {items.map((item, at) => (
          <View key={item.id} role="listitem" style={styles.item}>
            {numbered && <View style={styles.number}><Text kind="h2">{at + 1}</Text></View>}
            <View style={styles.words}>
              <RichText kind="strong" text={item.title} />
              <RichText kind="dense" tone="muted" text={item.detail} />
            </View>
          </View>
        ))}
      </View>
    </Card>
  );
});

export const Cautions = memo(function Cautions({ cautions }: { cautions: readonly Caution[] }) {
  if (cautions.length === 0) return null;
  return (
    <Card title={quickText.cautions} flush>
      <View role="list">
        {cautions.map((caution) => (
          <View key={caution.id} role="listitem" style={[styles.item, styles.caution]}>
            <View style={styles.icon}><CautionIcon /></View>
            <View style={styles.words}><RichText kind="dense" text={caution.text} /></View>
          </View>
        ))}
      </View>
    </Card>
  );
});

export const Sentences = memo(function Sentences({ title, sentences }: { title: string; sentences: readonly string[] }) {
  if (sentences.length === 0) return null;
  return (
    <Card title={title} flush>
      <View role="list">
        {sentences.map((sentence) => (
          <View key={sentence} role="listitem" style={styles.item}><View style={styles.words}><RichText kind="dense" text={sentence} /></View></View>
        ))}
      </View>
    </Card>
  );
});

/** The trail of one calculation: each step opens to its inputs, the relation with its numbers put in, and the source. */
export const TrailFold = memo(function TrailFold({ steps }: { steps: readonly TrailStep[] }) {
  if (steps.length === 0) return null;
  return (
    <Card flush>
      <Disclosure edge="none" label={quickText.trail} detail={quickText.trailDetail}>
        <View role="list">
          {steps.map((step, at) => <View key={step.key} role="listitem"><StepRow step={step} number={at + 1} /></View>)}
        </View>
      </Disclosure>
    </Card>
  );
});

/** One step, in the ink of what it is. Used by the case's trail as well. */
export function StepRow({ step, number, startOpen = false }: { step: TrailStep; number: number; startOpen?: boolean }) {
  return (
    <View style={styles.step}>
      <View style={styles.stepHead}>
        <View style={styles.icon}><Mark ink={step.ink} /></View>
        <View style={styles.words}>
          <Heading level={3} kind="strong" tone={step.ink} text={`${number}  ${step.title}`} />
          <RichText kind="dense" text={step.summary} />
          {step.flags.map((flag) => <RichText key={flag.id} kind="small" tone="caution" text={flag.text} />)}
        </View>
      </View>
      {(step.inputs.length > 0 || step.formula !== undefined || step.relation !== undefined) && (
        <Disclosure edge="none" label={quickText.stepInputs} startOpen={startOpen}>
          <View style={styles.inside}>
            {step.inputs.map((input) => (
              <View key={input.label} style={styles.input}>
                <View style={styles.inputLabel}><RichText kind="small" tone="muted" text={input.label} /></View>
                <View style={styles.words}><RichText kind="dense" text={input.value} /></View>
              </View>
            ))}
            {step.formula !== undefined && <RichText kind="formula" text={step.formula} />}
            {step.worked !== undefined && <View><Text kind="small" tone="muted">{quickText.worked}</Text><RichText text={step.worked} /></View>}
            {step.relation !== undefined && <View><Text kind="small" tone="muted">{quickText.source}</Text><RichText kind="dense" text={`${step.relation.name}. ${step.relation.citation}`} /></View>}
          </View>
        </Disclosure>
      )}
    </View>
  );
}

const styles = StyleSheet.create({
  item: { flexDirection: 'row', gap: space.md, paddingHorizontal: space.lg, paddingVertical: space.md, borderTopWidth: border.hair, borderTopColor: color.ruleSoft },
  caution: { backgroundColor: color.cautionTint },
  number: { width: 20 },
  icon: { paddingTop: 3 },
  words: { flex: 1, minWidth: 0 },
  step: { borderTopWidth: border.hair, borderTopColor: color.ruleSoft, paddingTop: space.md },
  stepHead: { flexDirection: 'row', gap: space.md, paddingHorizontal: space.lg },
  inside: { gap: space.sm, paddingLeft: space.xxl + space.md, paddingRight: space.lg, paddingBottom: space.md },
  input: { flexDirection: 'row', flexWrap: 'wrap', columnGap: space.md },
  inputLabel: { width: 132 },
});
