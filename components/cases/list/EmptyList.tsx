import { StyleSheet, View } from 'react-native';

import type { CaseListResponse } from '@/shared/contracts/cases';
import { uiCases } from '@/shared/text/uiCases';

import { space } from '../../theme/tokens';
import { Button } from '../../ui/Button';
import { Card } from '../../ui/Card';
import { Heading } from '../../ui/Heading';
import { LinkButton } from '../../ui/LinkButton';

import { Text } from '../../ui/Text';
import { isFiltered, type CaseFilter } from '../logic/listFilter';
import { EmptyTrail } from './EmptyTrail';

const say = uiCases.list;

/** No case to show: says what a case is, how to begin, and whether one that fits is elsewhere. */
export function EmptyList({ filter, found, change }: { filter: CaseFilter; found: CaseListResponse; change: (next: Partial<CaseFilter>) => void }) {
  const project = found.filters.projects.find((each) => each.id === filter.project)?.name;
  const onlyProject = filter.project !== undefined && !isFiltered({ ...filter, project: undefined });
  const title = onlyProject && project !== undefined ? say.emptyIn(project) : isFiltered(filter) ? say.emptyFiltered : say.emptyTitle;
  const isHelp = onlyProject || !isFiltered(filter);
  return (
    <View style={styles.column}>
      <Card>
        <View style={styles.inside}>
          <View style={styles.line}><EmptyTrail /></View>
          <Heading text={title} level={2} />
          <Text>{isHelp ? say.emptyLead : say.emptyFilteredLead}</Text>
          <View style={styles.acts}>
            {isHelp
              ? <><LinkButton kind="primary" href="/" label={say.startQuick} /><LinkButton href={filter.project ? `/cases/new?project=${filter.project}` : '/cases/new'} label={say.newCase} /></>
              : <Button label={say.clear} onPress={() => change({ q: undefined, project: undefined, state: undefined, grade: undefined, person: undefined, tag: undefined })} />}
          </View>
        </View>
      </Card>
      {found.elsewhere > 0 && filter.project !== undefined && (
        <View style={styles.elsewhere}>
          <Text kind="small" tone="muted">{say.elsewhere(found.elsewhere, filter.q ?? '')}</Text>
          <Button kind="quiet" label={say.showAll} onPress={() => change({ project: undefined })} />
        </View>
      )}
    </View>
  );
}

const styles = StyleSheet.create({
  column: { gap: space.md, maxWidth: 680 },
  inside: { gap: space.sm, paddingVertical: space.sm },
  line: { paddingBottom: space.sm },
  acts: { gap: space.sm, paddingTop: space.md },
  elsewhere: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: space.sm, paddingHorizontal: space.xs },
});
