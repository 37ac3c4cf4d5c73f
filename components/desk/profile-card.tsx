import { useState } from 'react';
import { View } from 'react-native';
import { Button } from '@/components/ui/button';
import { Card } from '@/components/ui/card';
import { TextField } from '@/components/ui/field';
import { SelectField } from '@/components/ui/select-field';
import { Txt } from '@/components/ui/text';
import { useToast } from '@/components/ui/toast';
import { useEditProfile } from '@/hooks/account/use-account';
import { localTimeZone } from '@/hooks/client/local-time-zone';
import { type Me } from '@/shared/account/account-endpoints';

/** Name, time zone and address of the person who is signed in. */
export function ProfileCard({ me }: { me: Me }) {
  const toast = useToast();
  const edit = useEditProfile();
  const [displayName, setDisplayName] = useState(me.person.displayName);
  const [timeZone, setTimeZone] = useState(me.person.timeZone);
  const zones = [
    ...new Set([
      me.person.timeZone,
      localTimeZone(),
      'America/New_York',
      'America/Chicago',
      'Europe/London',
      'Europe/Zurich',
      'Asia/Tokyo',
      'UTC',
    ]),
  ];
  const isChanged = displayName !== me.person.displayName || timeZone !== me.person.timeZone;
  return (
    <Card title="Profile" subtitle={me.person.email}>
      <View style={{ gap: 12 }}>
        <TextField
          label="Name"
          value={displayName}
          onChangeText={setDisplayName}
          error={edit.error?.problemOf('displayName')}
          autoComplete="name"
        />
        <SelectField
          label="Time zone"
          value={timeZone}
          options={zones.map((zone) => ({ value: zone, label: zone.replaceAll('_', ' ') }))}
          onChange={setTimeZone}
          hint="Times are shown in it; sessions are always the exchange’s."
        />
        {edit.error === null ? null : (
          <Txt size="row" colour="rust" role="alert">
            {`${edit.error.message} ${edit.error.action}`}
          </Txt>
        )}
        <View style={{ flexDirection: 'row' }}>
          <Button
            kind="secondary"
            label="Save profile"
            disabled={!isChanged}
            busy={edit.isPending}
            onPress={() =>
              edit.mutate(
                { body: { displayName, timeZone } },
                { onSuccess: () => toast.show({ text: 'Profile saved.' }) },
              )
            }
          />
        </View>
      </View>
    </Card>
  );
}
