import { lazy, Suspense, useState } from 'react';
import { StyleSheet, View } from 'react-native';

import { degree, hz } from '@/shared/format/number';
import { quickText } from '@/shared/text/quick';
import { relationText } from '@/shared/text/relations';

import { useEvaluate } from '../data/relations';
import { firstAtom, isWhole, type GroupPair } from '../quick/form';
import { space } from '../theme/tokens';
import { Button } from '../ui/Button';
import { PressRow } from '../ui/Card';
import { Field } from '../ui/Field';
import { LiveRegion } from '../ui/LiveRegion';
import { Notice } from '../ui/Notice';
import { RichText } from '../ui/RichText';
import { Sheet } from '../ui/Sheet';
import { plainText } from '@/shared/format/richText';
import { readAngle } from './readAngle';

const GroupsSheet = lazy(async () => ({ default: (await import('../quick/GroupsSheet')).GroupsSheet }));
interface Groups { front: GroupPair; rear: GroupPair }

/** J from φ, calculated by the server. `onGroups` only where the relation takes groups. */
export function CalculateSheet({ relation, groups, onGroups, onResult, onClose }: {
  relation: string; groups: Groups | null; onGroups?: (groups: Groups) => void; onResult: (at: { phiDeg: number; jHz: number }) => void; onClose: () => void;
}) {
  const [typed, setTyped] = useState('');
  const [wrong, setWrong] = useState(false);
  const [picking, setPicking] = useState(false);
  const evaluate = useEvaluate();
  const whole = groups !== null && isWhole(groups.front, groups.rear);
  const run = () => {
    const phiDeg = readAngle(typed);
    setWrong(phiDeg === null);
    if (phiDeg === null) return;
    evaluate.mutate({ relation, phiDeg, ...(onGroups && groups && { groups }) }, { onSuccess: ({ phiDeg: phi, jHz }) => onResult({ phiDeg: phi, jHz }) });
  };
  const result = evaluate.data && relationText.result(degree(evaluate.data.phiDeg, 1), hz(evaluate.data.jHz, 2));
  if (picking && onGroups && groups) {
    return <Suspense fallback={null}><GroupsSheet groups={groups} onUse={(next) => { onGroups(next); evaluate.reset(); setPicking(false); }} onClose={() => setPicking(false)} /></Suspense>;
  }
  return (
    <Sheet title={relationText.calculateTitle} onClose={onClose} actions={
      <Button grow={1} kind="primary" label={relationText.run} busy={evaluate.isPending && relationText.running} onPress={run} disabledBecause={onGroups && !whole ? relationText.groupsNeeded : undefined} />
    }>
      {onGroups && groups && (
        <PressRow label={relationText.giveGroups} value={whole ? `${quickText.front} ${groups.front.map(firstAtom).join(', ')} · ${quickText.rear} ${groups.rear.map(firstAtom).join(', ')}` : quickText.notGiven} onPress={() => setPicking(true)} />
      )}
      <View style={styles.body}>
        <Field label={relationText.phi} unit="°" inputMode="text" value={typed} onChange={(text) => { setTyped(text); setWrong(false); }} onSubmit={run} hint={relationText.phiHint} error={wrong ? relationText.phiWrong : undefined} />
        {evaluate.error && <Notice tone="error" text={evaluate.error.errors[0]?.detail ?? evaluate.error.detail} />}
        <LiveRegion message={result ? plainText(result) : ''} />
        {result !== undefined && evaluate.data && (
          <View style={styles.result}>
            <RichText kind="h2" text={result} />
            <RichText text={evaluate.data.worked} />
            <RichText kind="caption" tone="muted" text={relationText.resultNote} />
          </View>
        )}
      </View>
    </Sheet>
  );
}

const styles = StyleSheet.create({ body: { paddingHorizontal: space.lg, paddingVertical: space.md, gap: space.md }, result: { gap: space.xs } });
