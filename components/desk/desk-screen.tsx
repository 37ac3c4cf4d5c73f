import { useRouter } from 'expo-router';
import { View } from 'react-native';
import { DeskSettingsCard } from '@/components/desk/desk-settings-card';
import { ProfileCard } from '@/components/desk/profile-card';
import { ScreenFrame } from '@/components/frame/screen-frame';
import { UnreadyScreen } from '@/components/frame/unready-screen';
import { FileLinks } from '@/components/take-away/file-links';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { ChoiceRow } from '@/components/ui/choice-row';
import { DataTable } from '@/components/ui/table';
import { Txt } from '@/components/ui/text';
import { space } from '@/components/ui/theme/metrics';
import { useLayout } from '@/components/ui/use-layout';
import { useSignOut, useSwitchDesk } from '@/hooks/account/use-account';
import { useMe } from '@/hooks/account/use-me';
import { useDesk } from '@/hooks/desk/use-desk';
import { type Role } from '@/shared/contract/roles';
import { type Me } from '@/shared/account/account-endpoints';
import { type Desk } from '@/shared/desk/desk-endpoints';

const roleWords: Record<Role, string> = {
  trader: 'Trader: keeps a journal',
  mentor: 'Mentor: reads the sealed entries of their traders',
  lead: 'Lead: runs the desk and keeps a journal',
};

/** One's own profile, the desk's members and presets, and the way out. */
export function DeskScreen() {
  const { data: me } = useMe();
  const { data: desk, error, isPending, refetch } = useDesk();
  if (isPending || error || me === undefined || me === null)
    return <UnreadyScreen title="Desk" loading="Loading desk" error={error} onRetry={refetch} />;
  return <DeskBody me={me} desk={desk} />;
}

function DeskBody({ me, desk }: { me: Me; desk: Desk }) {
  const router = useRouter();
  const isWide = useLayout().kind === 'wide';
  const signOut = useSignOut();
  const column = isWide ? { flex: 1, minWidth: 0, gap: space.cardGap } : { gap: space.cardGap };
  const leave = () => signOut.mutate({}, { onSuccess: () => router.replace('/sign-in') });
  return (
    <ScreenFrame
      title={desk.settings.name}
      note={roleWords[me.desk.role]}
      action={<Button kind="secondary" icon="sign-out" label="Sign out" busy={signOut.isPending} onPress={leave} />}
    >
      <View
        style={
          isWide ? { flexDirection: 'row', gap: space.columnGap, alignItems: 'flex-start' } : { gap: space.cardGap }
        }
      >
        <View style={column}>
          <ProfileCard me={me} />
          <Card title="Take it away" subtitle="Every entry you may read, with forecasts, odds, fills and outcomes">
            <FileLinks />
          </Card>
          <Desks me={me} />
        </View>
        <View style={column}>
          <Card title="Members" subtitle={`${desk.members.length} on this desk`}>
            <DataTable
              caption="Members of the desk"
              columns={[
                { key: 'name', header: 'Name', flex: 1 },
                { key: 'role', header: 'Role', flex: 1 },
              ]}
              rows={desk.members.map(({ personId, displayName, role }) => ({
                key: personId,
                cells: { name: displayName, role },
              }))}
            />
          </Card>
          <DeskSettingsCard key={desk.settings.version} settings={desk.settings} canEdit={me.desk.role === 'lead'} />
        </View>
      </View>
    </ScreenFrame>
  );
}

function Desks({ me }: { me: Me }) {
  const router = useRouter();
  const change = useSwitchDesk();
  const others = me.desks.filter(({ id }) => id !== me.desk.id);
  if (others.length === 0) return null;
  return (
    <Card title="Your other desks">
      <View role="list">
        {others.map(({ id, name, role }) => (
          <ChoiceRow
            key={id}
            title={name}
            detail={role}
            disabled={change.isPending}
            onPress={() => change.mutate({ body: { deskId: id } }, { onSuccess: () => router.replace('/') })}
          />
        ))}
      </View>
      {change.error === null ? null : (
        <Txt size="row" colour="rust" role="alert">
          {`${change.error.message} ${change.error.action}`}
        </Txt>
      )}
    </Card>
  );
}
