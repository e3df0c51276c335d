import { useMemo, useState } from 'react';
import { StyleSheet, View } from 'react-native';

import type { RelationSummary } from '@/shared/contracts/relations';
import { fixed, hz } from '@/shared/format/number';
import { PROVENANCE_WORDS } from '@/shared/format/words';
import { relationText } from '@/shared/text/relations';
import { uiText } from '@/shared/text/ui';

import { useRelation } from '../data/relations';
import { LazyRelationCurve } from '../plots/LazyPlots';
import { isWhole, type GroupPair } from '../quick/form';
import { size, space } from '../theme/tokens';
import { Button } from '../ui/Button';
import { Card, CardBody, LinkRow } from '../ui/Card';
import { LinkButton } from '../ui/LinkButton';
import { Mark } from '../ui/Mark';
import { Notice } from '../ui/Notice';
import { RichText } from '../ui/RichText';
import { Columns, Screen } from '../ui/Screen';
import { ScreenState } from '../ui/ScreenState';
import { Table } from '../ui/Table';
import { Text } from '../ui/Text';
import { CalculateSheet } from './CalculateSheet';
import { AppliesTo, FailsWhen } from './Domain';
import { relationPath } from './relationPath';

/** One relation: formula, curve, parameters, where it holds and fails, outside checks, versions. */
export function RelationScreen({ relationId }: { relationId: string }) {
  const { data, relation, error, refetch, isFetching } = useRelation(relationId);
  if (!data && !error) return <Screen title={relationText.title} back="/relations"><ScreenState kind="loading" title={relationText.loading} /></Screen>;
  if (!data) {
    return (
      <Screen title={relationText.title} back="/relations">
        <ScreenState kind="error" title={error.body.title} hint={error.detail} action={<Button label={uiText.tryAgain} busy={isFetching && uiText.loading} onPress={() => void refetch()} />} />
      </Screen>
    );
  }
  if (!relation) {
    return (
      <Screen title={relationText.unknownTitle} back="/relations">
        <ScreenState kind="empty" title={relationText.unknownTitle} hint={relationText.unknownHint} action={<LinkButton kind="primary" href="/relations" label={relationText.toList} />} />
      </Screen>
    );
  }
  return <Detail relation={relation} versions={data.relations.filter((other) => other.id === relation.id)} />;
}

const EXAMPLE: { front: GroupPair; rear: GroupPair } = { front: ['C(C,H,H)', 'H'], rear: ['C(C,H,H)', 'H'] };

function Detail({ relation, versions }: { relation: RelationSummary; versions: readonly RelationSummary[] }) {
  const isTable = relation.kind === 'class-table';
  const needsGroups = relation.kind === 'generalised';
  const [groups, setGroups] = useState(needsGroups ? EXAMPLE : null);
  const [open, setOpen] = useState(false);
  const [at, setAt] = useState<{ phiDeg: number; jHz: number } | null>(null);
  const inputs = useMemo(() => (groups && isWhole(groups.front, groups.rear) ? { groups } : {}), [groups]);
  const ref = `${relation.id}@${relation.version}`;
  const first = (
    <>
      <Card>
        <View style={styles.formula}>
          <View style={styles.label}><Mark ink="calculated" size={13} /><Text kind="label" tone="calculated">{relationText.formula}</Text></View>
          <RichText kind="formula" text={isTable && relation.formula === '' ? relationText.noFormula : relation.formula} />
          <RichText kind="small" text={relation.citation + (relation.doi ? `. ${relationText.doi} ${relation.doi}` : '')} />
          <Marks relation={relation} />
        </View>
      </Card>
      {!isTable && (
        <Card title={relationText.curve} flush aside={relationText.spread(hz(relation.spreadHz))}>
          {groups && <CardBody><RichText kind="small" tone="muted" text={relationText.curveGroups(groups.front.join(', '), groups.rear.join(', '))} /></CardBody>}
          <LazyRelationCurve relation={ref} spreadHz={relation.spreadHz} inputs={inputs} at={at} />
        </Card>
      )}
      <Parameters relation={relation} />
      <Checks relation={relation} />
    </>
  );
  const second = (
    <>
      <AppliesTo relation={relation} />
      <FailsWhen failures={relation.failures} />
      <Versions current={ref} versions={versions} />
      <Card title={relationText.checkedBy}><RichText kind="dense" text={relation.checkedBy} /></Card>
    </>
  );
  return (
    <Screen title={relation.name} back="/relations" crumb={relationText.crumb(relation.coupling, relation.version)}
      actions={isTable ? undefined : <Button grow={1} kind="primary" label={relationText.calculate} opens="dialog" onPress={() => setOpen(true)} />}>
      <Columns side="second" narrow={size.aside} first={first} second={second} />
      {open && (
        <CalculateSheet relation={ref} groups={groups} onGroups={needsGroups ? (next) => { setGroups(next); setAt(null); } : undefined} onResult={setAt} onClose={() => setOpen(false)} />
      )}
    </Screen>
  );
}

/** What in it was not seen in a public text, said where the numbers stand. */
function Marks({ relation }: { relation: RelationSummary }) {
  const lines = [
    relation.provenance === 'seen' ? null : relationText.provenance[relation.provenance],
    relation.spreadProvenance === 'seen' || relation.kind === 'class-table' ? null : relationText.spreadProvenance[relation.spreadProvenance],
  ].filter((line) => line !== null);
  return lines.length === 0 ? null : <Notice text={`${relationText.toBeChecked} ${lines.join(' ')}`} />;
}

function Parameters({ relation }: { relation: RelationSummary }) {
  const sets = [...new Set(relation.parameters.map((parameter) => parameter.set))];
  const names = [...new Set(relation.parameters.map((parameter) => parameter.name))];
  if (names.length === 0) return null;
  const find = (set: string | null, name: string) => relation.parameters.find((parameter) => parameter.set === set && parameter.name === name);
  const say = relationText.parameterColumns;
  const shown = (set: string | null, name: string) => {
    const found = find(set, name);
    if (!found) return '–';
    // as many decimals as the column needs, so that its points stand under each other
    const decimals = Math.max(...sets.map((other) => decimalsOf(find(other, name)?.value ?? 0)));
    return `${found.value === 0 ? '0' : fixed(found.value, decimals)}${found.unit === '°' ? '°' : ''}`;
  };
  return (
    <Card title={relationText.parameters} flush>
      <Table caption={relationText.parameters} rows={sets} rowKey={(set) => set ?? 'one'} columns={[
        ...(sets.length > 1 || sets[0] !== null ? [{ key: 'set', head: say.set, rowHeader: true, cell: (set: string | null) => set ?? '' }] : []),
        ...names.map((name) => ({ key: name, head: parameterHead(name), numeric: true, cell: (set: string | null) => shown(set, name) })),
        { key: 'origin', head: say.origin, wraps: true, cell: (set) => PROVENANCE_WORDS[find(set, names[0]!)?.provenance ?? 'memory'] },
      ]} />
    </Card>
  );
}

const decimalsOf = (value: number) => Math.min(4, `${value}`.split('.')[1]?.length ?? 0);
const SUBSCRIPT = '₀₁₂₃₄₅₆₇₈₉';
/** P1 as _P_₁; a word stays a word. */
const parameterHead = (name: string) => name.replace(/^([A-Za-z])(\d*)$/, (_, letters: string, digits: string) => `_${letters}_${[...digits].map((digit) => SUBSCRIPT[Number(digit)]).join('')}`);

function Checks({ relation }: { relation: RelationSummary }) {
  if (relation.checks.length === 0) return null;
  const say = relationText.checkColumns;
  return (
    <Card title={relationText.checks} flush aside={relationText.checksAside}>
      <Table caption={relationText.checks} rows={relation.checks} rowKey={(check, at) => `${check.name}${at}`} columns={[
        { key: 'name', head: say.name, rowHeader: true, wraps: true, cell: (check) => check.name },
        { key: 'calculated', head: say.calculated, numeric: true, tone: 'calculated', cell: (check) => fixed(check.calculatedHz, 2) },
        { key: 'measured', head: say.measured, numeric: true, tone: 'measured', cell: (check) => check.measured.replace(/\u00a0Hz$/, '') },
        { key: 'source', head: say.source, wraps: true, tone: 'muted', cell: (check) => check.source },
      ]} />
    </Card>
  );
}

function Versions({ current, versions }: { current: string; versions: readonly RelationSummary[] }) {
  return (
    <Card title={relationText.versions} flush aside={relationText.versionsAside}>
      {[...versions].sort((a, b) => b.version - a.version).map((version) => (
        <LinkRow key={version.version} href={relationPath(version)} value={relationText.versionLine(version.version, relationText.status[version.status])} tone={`${version.id}@${version.version}` === current ? 'chosen' : 'plain'} />
      ))}
    </Card>
  );
}

const styles = StyleSheet.create({
  formula: { gap: space.sm },
  label: { flexDirection: 'row', alignItems: 'center', gap: 6 },
});
