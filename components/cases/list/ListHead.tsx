import { useState } from 'react';
import { StyleSheet, View } from 'react-native';

import type { CaseListResponse } from '@/shared/contracts/cases';
import { uiCases } from '@/shared/text/uiCases';

import { space } from '../../theme/tokens';
import { Button } from '../../ui/Button';
import { RadioRow, RadioRows } from '../../ui/Choice';
import { Icon } from '../../ui/Glyph';
import { Sheet } from '../../ui/Sheet';
import { Text } from '../../ui/Text';
import { CASE_SORTS, type CaseFilter } from '../logic/listFilter';

const say = uiCases.list;

/** How many, how many are open, and in which order. */
export function ListHead({ found, filter, change }: { found: CaseListResponse; filter: CaseFilter; change: (next: Partial<CaseFilter>) => void }) {
  return (
    <View style={styles.row}>
      <Text kind="smallStrong">{say.count(found.total)}</Text>
      <View style={styles.rest}><Text kind="small" tone="muted">{say.openOnes(found.open, found.notDecided)}</Text></View>
      <SortButton filter={filter} change={change} />
    </View>
  );
}

export function SortButton({ filter, change }: { filter: CaseFilter; change: (next: Partial<CaseFilter>) => void }) {
  const [open, setOpen] = useState(false);
  const sort = filter.sort ?? 'changed';
  return (
    <>
      <Button small kind="quiet" label={say.sorts[sort]} about={say.sortBy} icon={<Icon name="down" size={14} />} opens="dialog" onPress={() => setOpen(true)} />
      {open && (
        <Sheet title={say.sortBy} onClose={() => setOpen(false)}>
          <RadioRows label={say.sortBy}>
            {CASE_SORTS.map((each) => <RadioRow key={each} label={say.sorts[each]} chosen={each === sort} onPress={() => { change({ sort: each }); setOpen(false); }} />)}
          </RadioRows>
        </Sheet>
      )}
    </>
  );
}

const styles = StyleSheet.create({
  row: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: space.sm },
  rest: { flex: 1, minWidth: 0 },
});
