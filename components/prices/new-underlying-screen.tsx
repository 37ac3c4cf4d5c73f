import { useRouter } from 'expo-router';
import { ScreenFrame } from '@/components/frame/screen-frame';
import { UnderlyingForm } from '@/components/prices/underlying-form';
import { useMe } from '@/hooks/account/use-me';
import { useCreateUnderlying } from '@/hooks/underlyings/use-underlyings';

/** Adds an underlying, then leads to its bars. */
export function NewUnderlyingScreen() {
  const router = useRouter();
  const { data: me } = useMe();
  const create = useCreateUnderlying();
  return (
    <ScreenFrame
      title="Add an underlying"
      note="Its bars come next"
      back={{ label: 'Prices', onPress: () => router.navigate('/prices') }}
    >
      <UnderlyingForm
        initial={{
          symbol: '',
          name: '',
          style: 'american',
          settlement: 'physical',
          settlementTime: 'pm',
          multiplier: '100',
          dividendYield: 0,
          currency: me?.desk.settings.currency ?? 'USD',
        }}
        submitLabel="Add underlying"
        isBusy={create.isPending}
        error={create.error}
        onSubmit={(values, id) =>
          create.mutate(
            { body: { id, ...values } },
            {
              onSuccess: () =>
                router.replace({ pathname: '/prices/[underlyingId]/upload', params: { underlyingId: id } }),
            },
          )
        }
      />
    </ScreenFrame>
  );
}
