import { StyleSheet, View } from 'react-native';

import { dayWords } from '@/shared/format/when';
import { STATE_WORDS } from '@/shared/format/words';
import { uiCaseParts } from '@/shared/text/uiCaseParts';
import { uiCases } from '@/shared/text/uiCases';

import { Plan } from '../quick/Findings';
import { ReviewCard } from '../reviews/ReviewCard';
import { size, space } from '../theme/tokens';
import { useLayout } from '../theme/useLayout';
import { Tag } from '../ui/Badge';
import { Button } from '../ui/Button';
import { LinkButton, TextLink } from '../ui/LinkButton';
import { Notice } from '../ui/Notice';
import { Screen, Stack } from '../ui/Screen';
import { useCaseView } from './caseContext';
import { AnswerArea } from './parts/AnswerArea';
import { CalculationCards } from './parts/CalculationCards';
import { CandidatesCard } from './parts/CandidatesCard';
import { CommentsCard } from './parts/CommentsAt';
import { CompoundCard, conditionsLine } from './parts/CompoundCard';
import { EvidenceCard } from './parts/EvidenceCard';
import { FactsCard } from './parts/FactsCard';
import { KeptLine } from './parts/KeptLine';
import { PrimaryAct } from './parts/PrimaryAct';
import { ReadingsCard } from './parts/ReadingsCard';
import { Section } from './parts/Section';
import { TrailColumn } from './parts/TrailColumn';

/** Three columns from 1180, two from 1024, one line down the left margin on a phone. */
export function CaseLayout({ isOutdated }: { isOutdated: boolean }) {
  const { found, content, open } = useCaseView();
  const { isWide, hasThreeColumns } = useLayout();
  const isReviewing = found.state !== 'draft';
  const crumb = isWide && conditionsLine(content) !== '' ? `${uiCases.frame.crumb(found.code, found.project.name, found.revision)} · ${conditionsLine(content)}` : uiCases.frame.crumb(found.code, found.project.name, found.revision);
  return (
    <Screen title={content.question} documentTitle={`${found.code} · ${content.question}`} crumb={crumb} back="/cases" aside={isWide ? <Facts /> : undefined} actions={
      <>
        {isWide && <LinkButton href={`/cases/${found.id}/sheet`} label={uiCases.frame.sheet} />}
        <Button label={uiCases.frame.more} opens="dialog" onPress={() => open({ kind: 'more' })} grow={isWide ? undefined : 1} />
        <PrimaryAct />
      </>
    }>
      <Stack>
        {!isWide && <Facts />}
        {isOutdated && <Notice text={uiCases.frame.showingKept} />}
        {found.supersededBy !== null && <TextLink href={`/cases/${found.supersededBy.id}`} label={uiCases.frame.supersededBy(found.supersededBy.code)} />}
        {found.supersedes !== null && <TextLink href={`/cases/${found.supersedes.id}`} label={uiCases.frame.supersedes(found.supersedes.code)} />}
        <KeptLine />
        {!isWide ? <PhoneParts isReviewing={isReviewing} /> : (
          <View style={styles.columns}>
            {hasThreeColumns && <View style={styles.trail}><TrailColumn /></View>}
            <View style={styles.middle}><MiddleParts isReviewing={isReviewing} hasTrail={hasThreeColumns} /></View>
            <View style={styles.review}><Stack><ReviewCard /><CommentsCard /></Stack></View>
          </View>
        )}
      </Stack>
    </Screen>
  );
}

/** State, people and the day it is due. */
function Facts() {
  const { found, now } = useCaseView();
  const { isWide } = useLayout();
  const { dueOn, reviewer } = found.review;
  return (
    <View style={styles.facts}>
      <Tag text={STATE_WORDS[found.state]} tone={found.state === 'queried' ? 'caution' : 'plain'} />
      <Tag text={isWide ? uiCases.frame.author(found.author.name) : found.author.name} />
      {!isWide && reviewer !== null && <Tag text={uiCases.frame.reviewer(reviewer.name)} />}
      {dueOn !== null && (found.state === 'in-review' || found.state === 'queried') && <Tag text={uiCases.frame.due(dayWords(dueOn, now))} />}
    </View>
  );
}

/** A reviewer's order: answer, candidates, what was not tested, readings, plots. An author fills from the readings down. */
function MiddleParts({ isReviewing, hasTrail }: { isReviewing: boolean; hasTrail: boolean }) {
  const { found, open } = useCaseView();
  return (
    <Stack>
      <AnswerArea />
      {!hasTrail && <Button label={uiCaseParts.trail.open} opens="dialog" onPress={() => open({ kind: 'trail' })} />}
      {isReviewing
        ? <><CandidatesCard /><FactsCard /><CompoundCard /><ReadingsCard /><CalculationCards /></>
        : <><CompoundCard /><ReadingsCard /><CalculationCards /><CandidatesCard /><FactsCard /></>}
      <EvidenceCard />
      <Plan title={uiCaseParts.next.title} items={found.trail.measureNext} numbered />
    </Stack>
  );
}

function PhoneParts({ isReviewing }: { isReviewing: boolean }) {
  const { found, content, open } = useCaseView();
  return (
    <Stack>
      <AnswerArea />
      {isReviewing && <FactsCard />}
      <View style={styles.line}>
        <Section ink="measured" aside={conditionsLine(content) || undefined}><CompoundCard /><ReadingsCard /><EvidenceCard /></Section>
        <Section ink="calculated"><CandidatesCard /><CalculationCards /><Plan title={uiCaseParts.next.title} items={found.trail.measureNext} numbered /></Section>
        <Section ink="judged" aside={found.author.name} last>
          {!isReviewing && <FactsCard />}
          <Button label={uiCaseParts.trail.open} opens="dialog" onPress={() => open({ kind: 'trail' })} />
          <ReviewCard />
          <CommentsCard />
        </Section>
      </View>
    </Stack>
  );
}

const styles = StyleSheet.create({
  columns: { flexDirection: 'row', alignItems: 'flex-start', gap: space.xl },
  trail: { width: size.trail },
  middle: { flex: 1, minWidth: 0 },
  review: { width: size.review },
  facts: { flexDirection: 'row', flexWrap: 'wrap', gap: space.sm },
  line: { paddingTop: space.sm },
});
