import { useState } from 'react';
import { StyleSheet, View } from 'react-native';

import type { AdminUsersResponse } from '@/shared/contracts/team';
import { momentWords } from '@/shared/format/when';
import { uiAccount } from '@/shared/text/uiAccount';

import { useAdminUsers, useChangeUser } from '../data/admin';
import { useReader } from '../data/reader';
import { FormSheet } from '../forms/FormSheet';
import { LoadProblem, ProblemNotice } from '../forms/ProblemNotice';
import { SignInState } from '../forms/SignInState';
import { border, color, space } from '../theme/tokens';
import { useLayout } from '../theme/useLayout';
import { Tag } from '../ui/Badge';
import { Button } from '../ui/Button';
import { Card } from '../ui/Card';
import { LiveRegion } from '../ui/LiveRegion';
import { RichText } from '../ui/RichText';
import { Screen, Stack } from '../ui/Screen';
import { ScreenState } from '../ui/ScreenState';
import { Table } from '../ui/Table';
import { Text } from '../ui/Text';

const say = uiAccount.admin;
type Account = AdminUsersResponse['users'][number];

/** Accounts of this server: who may sign in, and who administers. No case is seen by that. */
export function AdminScreen() {
  const { user, isLoading } = useReader();
  const isAdministrator = user?.siteRole === 'administrator';
  const { data, error, isFetching, refetch } = useAdminUsers(isAdministrator);
  const active = data?.users.filter((each) => each.status === 'active').length ?? 0;
  return (
    <Screen title={say.title} aside={data && say.count(active, data.users.length - active)} back="/account">
      {user === null && !isLoading ? <SignInState from="/admin" />
        : user !== null && !isAdministrator ? <ScreenState kind="empty" title={say.refused} />
        : data === undefined && error !== null ? <LoadProblem problem={error} again={() => void refetch()} isTrying={isFetching} />
        : data === undefined ? <ScreenState kind="loading" title={say.loading} />
        : <Accounts users={data.users} ownId={user!.id} />}
    </Screen>
  );
}

function Accounts({ users, ownId }: { users: Account[]; ownId: string }) {
  const { isWide } = useLayout();
  const change = useChangeUser();
  const [asked, setAsked] = useState<Account | null>(null);
  const set = (account: Account, to: Partial<Pick<Account, 'siteRole' | 'status'>>) =>
    change.mutate({ userId: account.id, siteRole: account.siteRole, status: account.status, ...to }, { onSettled: () => setAsked(null) });
  const acts = (account: Account) => account.id !== ownId && (
    <View style={styles.acts}>
      <Button small label={account.siteRole === 'administrator' ? say.makeMember : say.makeAdministrator} about={account.name}
        onPress={() => set(account, { siteRole: account.siteRole === 'administrator' ? 'member' : 'administrator' })} />
      {account.status === 'active'
        ? <Button small kind="danger" label={say.disable} about={account.name} opens="dialog" onPress={() => setAsked(account)} />
        : <Button small label={say.enable} about={account.name} onPress={() => set(account, { status: 'active' })} />}
    </View>
  );
  const now = new Date();
  const seen = (account: Account) => (account.lastSignInAt === null ? say.never : momentWords(account.lastSignInAt, now));
  const tags = (account: Account) => (
    <View style={styles.tags}>
      {account.id === ownId && <Tag text={say.you} tone="muted" />}
      {account.isDemo && <Tag text={say.demo} tone="muted" />}
      {account.status === 'disabled' && <Tag text={say.disabled} tone="caution" />}
    </View>
  );
  return (
    <Stack>
      <RichText text={say.lead} tone="muted" />
      <ProblemNotice problem={change.error} />
      <LiveRegion message={change.isSuccess ? say.changed(users.find((each) => each.id === change.variables.userId)?.name ?? '') : ''} />
      {isWide ? (
        <Card flush>
          <Table caption={say.title} rows={users} rowKey={(account) => account.id} columns={[
            { key: 'name', head: say.head.name, rowHeader: true, cell: (account) => <View style={styles.name}><Text kind="denseStrong">{account.name}</Text>{tags(account)}</View> },
            { key: 'email', head: say.head.email, cell: (account) => <Text kind="dense">{account.email}</Text> },
            { key: 'role', head: say.head.role, cell: (account) => uiAccount.account[account.siteRole] },
            { key: 'projects', head: say.head.projects, wraps: true, cell: (account) => <Text kind="dense">{account.projects.join(', ') || say.noProjects}</Text> },
            { key: 'seen', head: say.head.lastSeen, cell: seen },
            { key: 'acts', head: '', spoken: say.head.status, cell: acts },
          ]} />
        </Card>
      ) : (
        <Card flush>
          {users.map((account) => (
            <View key={account.id} style={styles.row}>
              <View style={styles.name}><Text kind="strong">{account.name}</Text>{tags(account)}</View>
              <Text kind="small" tone="muted">{account.email}</Text>
              <Text kind="small">{`${uiAccount.account[account.siteRole]} · ${account.projects.join(', ') || say.noProjects}`}</Text>
              <Text kind="small" tone="muted">{`${say.head.lastSeen}: ${seen(account)}`}</Text>
              {acts(account)}
            </View>
          ))}
        </Card>
      )}
      {asked !== null && (
        <FormSheet title={say.askDisable(asked.name)} onClose={() => setAsked(null)} act={say.disable} danger busy={change.isPending && uiAccount.saving}
          onAct={() => set(asked, { status: 'disabled' })} second={{ label: say.keep, onPress: () => setAsked(null) }}>
          <RichText text={say.askDisableNote} />
        </FormSheet>
      )}
    </Stack>
  );
}

const styles = StyleSheet.create({
  acts: { flexDirection: 'row', flexWrap: 'wrap', gap: space.sm },
  tags: { flexDirection: 'row', flexWrap: 'wrap', gap: space.xs },
  name: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: space.sm },
  row: { padding: space.lg, gap: space.xs, borderTopWidth: border.hair, borderTopColor: color.ruleSoft },
});
