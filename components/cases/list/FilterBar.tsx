import { useEffect, useState } from 'react';
import { StyleSheet, View } from 'react-native';

import type { CaseListResponse } from '@/shared/contracts/cases';
import { GRADE_WORDS, STATE_WORDS } from '@/shared/format/words';
import { LIMITS } from '@/shared/limits';
import { uiCases } from '@/shared/text/uiCases';
import { GRADES } from '@/shared/types/answer';
import { CASE_STATES } from '@/shared/types/case';

import { space } from '../../theme/tokens';
import { useLayout } from '../../theme/useLayout';
import { RadioRow, RadioRows } from '../../ui/Choice';
import { Field } from '../../ui/Field';
import { FilterChip } from '../../ui/FilterChip';
import { Sheet } from '../../ui/Sheet';
import { Text } from '../../ui/Text';
import { isFiltered, type CaseFilter } from '../logic/listFilter';
import { Button } from '../../ui/Button';

const say = uiCases.list;
const REST_MS = 300;
type Key = 'project' | 'state' | 'grade' | 'person' | 'tag';
interface Choice { value: string; label: string; detail?: string }

/** Search and filters. The search waits for a rest in typing; the chips open a sheet each. */
export function FilterBar({ filter, choices, change }: { filter: CaseFilter; choices: CaseListResponse['filters']; change: (next: Partial<CaseFilter>) => void }) {
  const { isWide } = useLayout();
  const [open, setOpen] = useState<Key | null>(null);
  const lists: Record<Key, { any: string; choices: Choice[] }> = {
    project: { any: say.allProjects, choices: choices.projects.map((project) => ({ value: project.id, label: project.name, detail: project.key })) },
    state: { any: say.anyState, choices: CASE_STATES.map((state) => ({ value: state, label: STATE_WORDS[state] })) },
    grade: { any: say.anyAnswer, choices: GRADES.map((grade) => ({ value: grade, label: GRADE_WORDS[grade] })) },
    person: { any: say.anyPerson, choices: choices.people.map((person) => ({ value: person.id, label: person.name })) },
    tag: { any: say.anyTag, choices: choices.tags.map((tag) => ({ value: tag, label: tag })) },
  };
  const names: Record<Key, string> = { project: say.anyProject, state: say.state, grade: say.answer, person: say.person, tag: say.tag };
  const set = (key: Key, value: string | undefined) => { change({ [key]: value }); setOpen(null); };
  const chip = (key: Key) => {
    const value = filter[key];
    const chosen = lists[key].choices.find((choice) => choice.value === value)?.label ?? value;
    return (
      <FilterChip key={key} label={chosen === undefined ? (key === 'project' ? say.allProjects : names[key]) : chosen} on={value !== undefined} opens
        onPress={() => setOpen(key)} onClear={() => set(key, undefined)} clearLabel={`${say.clear}: ${names[key]}`} />
    );
  };
  return (
    <View style={[styles.bar, isWide && styles.wide]}>
      <View style={isWide ? styles.searchWide : undefined}><Search value={filter.q ?? ''} onChange={(q) => change({ q: q === '' ? undefined : q })} /></View>
      <View role="group" aria-label={say.filters} style={[styles.chips, isWide && styles.chipsWide]}>
        {(['project', 'state', 'grade', 'person', 'tag'] as const).map(chip)}
        {isFiltered(filter) && <Button small kind="quiet" label={say.clear} onPress={() => change({ q: undefined, project: undefined, state: undefined, grade: undefined, person: undefined, tag: undefined })} />}
      </View>
      {open !== null && (
        <Sheet title={names[open]} onClose={() => setOpen(null)}>
          {open === 'tag' && choices.tags.length === 0
            ? <View style={styles.none}><Text tone="muted">{say.noTags}</Text></View>
            : (
              <RadioRows label={names[open]}>
                <RadioRow label={lists[open].any} chosen={filter[open] === undefined} onPress={() => set(open, undefined)} />
                {lists[open].choices.map((choice) => (
                  <RadioRow key={choice.value} label={choice.label} detail={choice.detail} chosen={filter[open] === choice.value} onPress={() => set(open, choice.value)} />
                ))}
              </RadioRows>
            )}
        </Sheet>
      )}
    </View>
  );
}

/** Types freely; the address follows after a rest, and the field follows the address when it is changed from elsewhere. */
function Search({ value, onChange }: { value: string; onChange: (q: string) => void }) {
  const [typed, setTyped] = useState(value);
  const [sent, setSent] = useState(value);
  if (value !== sent) { setSent(value); if (value !== typed.trim()) setTyped(value); }
  useEffect(() => {
    const wanted = typed.trim();
    if (wanted === value) return;
    const timer = setTimeout(() => onChange(wanted), REST_MS);
    return () => clearTimeout(timer);
  }, [typed, value, onChange]);
  return <Field label={say.search} value={typed} onChange={setTyped} onSubmit={() => onChange(typed.trim())} inputMode="search" enterKeyHint="search" maxLength={LIMITS.search} />;
}

const styles = StyleSheet.create({
  bar: { gap: space.md },
  wide: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'flex-end' },
  searchWide: { width: 320 },
  chips: { flexDirection: 'row', flexWrap: 'wrap', gap: space.sm, alignItems: 'center', flexShrink: 1 },
  chipsWide: { paddingBottom: space.sm },
  none: { padding: space.lg },
});
