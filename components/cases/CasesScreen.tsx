import { router, useLocalSearchParams } from 'expo-router';
import { useCallback, useMemo } from 'react';
import { View } from 'react-native';

import type { CaseListResponse } from '@/shared/contracts/cases';
import { uiCases } from '@/shared/text/uiCases';

import { draftKeys } from '../data/drafts';
import { useCaseList } from '../data/cases';
import { useReader } from '../data/reader';
import { LoadProblem } from '../forms/ProblemNotice';
import { SignInState } from '../forms/SignInState';
import { useLayout } from '../theme/useLayout';
import { Button } from '../ui/Button';
import { Icon } from '../ui/Glyph';
import { LinkButton } from '../ui/LinkButton';
import { LiveRegion } from '../ui/LiveRegion';
import { Notice } from '../ui/Notice';
import { Screen, Stack } from '../ui/Screen';
import { ScreenState } from '../ui/ScreenState';
import { CaseRows } from './list/CaseRows';
import { CaseTable } from './list/CaseTable';
import { EmptyList } from './list/EmptyList';
import { FilterBar } from './list/FilterBar';
import { ListHead } from './list/ListHead';
import { filterFrom, paramsOf, searchOf, type CaseFilter } from './logic/listFilter';

const say = uiCases.list;

/** The project log. What it shows is in the address: filter, search and order survive a reload and can be sent as a link. */
export function CasesScreen() {
  const params = useLocalSearchParams();
  const filter = useMemo(() => filterFrom(params), [params]);
  const { isSignedIn, isLoading, reader } = useReader();
  const list = useCaseList(searchOf(filter), isSignedIn);
  const change = useCallback((next: Partial<CaseFilter>) => router.setParams(paramsOf({ ...filter, ...next })), [filter]);
  const first = list.data?.pages[0];
  const { isWide } = useLayout();
  const mayCreate = (first?.filters.projects ?? reader?.projects ?? []).some((project) => project.role !== 'reader');
  return (
    <Screen title={say.title} aside={isWide && first !== undefined ? say.inProjects(first.total, filter.project ? 1 : first.filters.projects.length) : undefined}
      actions={isSignedIn && mayCreate ? <LinkButton kind="primary" href={filter.project ? `/cases/new?project=${filter.project}` : '/cases/new'} label={say.newCase} icon={<Icon name="plus" tone="onInk" />} grow={isWide ? undefined : 1} /> : undefined}>
      {!isSignedIn && !isLoading ? <SignInState from="/cases" />
        : list.error !== null && first === undefined ? <LoadProblem problem={list.error} again={() => void list.refetch()} isTrying={list.isFetching} />
        : first === undefined ? <ScreenState kind="loading" title={say.loading} />
        : <Log first={first} list={list} filter={filter} change={change} userId={reader?.id ?? ''} />}
    </Screen>
  );
}

function Log({ first, list, filter, change, userId }: {
  first: CaseListResponse; list: ReturnType<typeof useCaseList>; filter: CaseFilter; change: (next: Partial<CaseFilter>) => void; userId: string;
}) {
  const { isWide } = useLayout();
  const rows = list.data?.pages.flatMap((page) => page.cases) ?? [];
  const onDevice = useMemo(() => new Set(draftKeys(userId).flatMap((key) => /^case\.([0-9a-f-]{36})/.exec(key)?.[1] ?? [])), [userId]);
  const older = list.hasNextPage
    ? <Button small label={say.older} busy={list.isFetchingNextPage && say.loadingOlder} onPress={() => void list.fetchNextPage()} />
    : undefined;
  if (first.filters.projects.length === 0) return <ScreenState kind="empty" title={say.noProject} hint={say.noProjectHint} action={<LinkButton kind="primary" href="/" label={say.startQuick} />} />;
  return (
    <Stack>
      {list.error !== null && <Notice text={say.showingKept} action={<Button small label={say.tryAgain} onPress={() => void list.refetch()} />} />}
      <FilterBar filter={filter} choices={first.filters} change={change} />
      <LiveRegion message={list.isPlaceholderData ? '' : say.count(first.total)} />
      <View aria-busy={list.isPlaceholderData || undefined}>
        {rows.length === 0 ? <EmptyList filter={filter} found={first} change={change} />
          : isWide ? <CaseTable rows={rows} onDevice={onDevice} total={first.total} older={older} filter={filter} change={change} />
          : (
            <>
              <ListHead found={first} filter={filter} change={change} />
              <CaseRows rows={rows} onDevice={onDevice} />
              {list.hasNextPage && <View style={{ paddingTop: 16 }}>{older}</View>}
            </>
          )}
      </View>
    </Stack>
  );
}
