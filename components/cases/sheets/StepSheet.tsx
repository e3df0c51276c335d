import { StyleSheet, View } from 'react-native';

import { hz } from '@/shared/format/number';
import { uiCaseParts } from '@/shared/text/uiCaseParts';
import { uiReviews } from '@/shared/text/uiReviews';

import { asPath } from '../../auth/safePath';
import { color, radius, space } from '../../theme/tokens';
import { Button } from '../../ui/Button';
import { Heading } from '../../ui/Heading';
import { LinkButton } from '../../ui/LinkButton';
import { Mark } from '../../ui/Mark';
import { Notice } from '../../ui/Notice';
import { RichText } from '../../ui/RichText';
import { Sheet } from '../../ui/Sheet';
import { Text } from '../../ui/Text';
import { QueryThread } from '../../reviews/QueryThread';
import { CommentsAt } from '../parts/CommentsAt';
import { useCaseView } from '../caseContext';
import { numberedSteps } from '../logic/trailSteps';

const say = uiCaseParts.trail;

/** One step of the trail: what it used, the relation with its numbers put in, the source, and what was asked about it. */
export function StepSheet({ stepKey, onClose }: { stepKey: string; onClose: () => void }) {
  const { found, open } = useCaseView();
  const each = numberedSteps(found.trail, found.review.queries).find(({ step }) => step.key === stepKey);
  if (each === undefined) return null;
  const { step, number, allQueries } = each;
  return (
    <Sheet title={`${number}  ${step.title}`} onClose={onClose} actions={found.may.query ? <Button grow={1} label={uiReviews.column.newQuery} opens="dialog" onPress={() => open({ kind: 'query', stepKey })} /> : undefined}>
      <View style={styles.body}>
        <View style={styles.summary}><View style={styles.mark}><Mark ink={step.ink} size={16} /></View><View style={styles.words}><RichText kind="strong" text={step.summary} /></View></View>
        {step.flags.map((flag) => <Notice key={flag.id} text={flag.text} />)}
        {step.inputs.length > 0 && (
          <View>
            <Heading text={say.inputs} level={3} />
            {step.inputs.map((input, at) => (
              <View key={at} style={styles.input}>
                <View style={styles.label}><RichText kind="small" tone="muted" text={input.label} /></View>
                <View style={styles.words}><RichText kind="dense" text={input.value} /></View>
              </View>
            ))}
          </View>
        )}
        {step.formula !== undefined && <View><Heading text={say.formula} level={3} /><RichText kind="formula" text={step.formula} /></View>}
        {step.worked !== undefined && <View style={styles.worked}><Text kind="label" tone="calculated">{say.worked}</Text><RichText text={step.worked} /></View>}
        {step.relation !== undefined && (
          <View style={styles.source}>
            <Heading text={say.source} level={3} />
            <RichText text={`${step.relation.name}, version ${step.relation.version}`} kind="strong" />
            <RichText text={step.relation.citation} kind="dense" />
            <RichText text={`${say.spread(hz(step.relation.spreadHz))} (${say.marks[step.relation.spreadProvenance]}); parameters ${say.marks[step.relation.provenance]}`} kind="small" tone="muted" />
            <LinkButton small href={asPath(`/relations/${encodeURIComponent(`${step.relation.id}@${step.relation.version}`)}`)} label={uiCaseParts.calculation.openRelation} />
          </View>
        )}
        {found.review.queries.filter((query) => allQueries.includes(query.number)).map((query) => <QueryThread key={query.id} query={query} stepNumber={number} />)}
        <CommentsAt target={step.key} label={step.title} />
      </View>
    </Sheet>
  );
}

const styles = StyleSheet.create({
  body: { paddingHorizontal: space.lg, gap: space.lg },
  summary: { flexDirection: 'row', gap: space.md },
  mark: { paddingTop: 4 },
  words: { flex: 1, minWidth: 0 },
  input: { flexDirection: 'row', flexWrap: 'wrap', columnGap: space.md, paddingVertical: space.xs },
  label: { width: 132 },
  worked: { backgroundColor: color.calculatedTint, borderRadius: radius.control, padding: space.md, gap: space.xs },
  source: { gap: space.xs, alignItems: 'flex-start' },
});
