import { type HandlersOf } from '@/server/http/handler';
import { BarService } from '@/server/prices/bar-service';
import { type OnBarsChanged } from '@/server/prices/bars-changed';
import { type Clock } from '@/server/runtime/clock';
import { type Ids } from '@/server/runtime/ids';
import { UnderlyingService } from '@/server/underlyings/underlying-service';
import { type underlyingEndpoints } from '@/shared/underlyings/underlying-endpoints';

export interface UnderlyingDeps {
  readonly clock: Clock;
  readonly ids: Ids;
  readonly onBarsChanged: OnBarsChanged;
}

export function underlyingHandlers(deps: UnderlyingDeps): HandlersOf<typeof underlyingEndpoints> {
  const underlyings = new UnderlyingService(deps);
  const bars = new BarService(deps);
  return {
    listUnderlyings: async ({ scope }) => ({ underlyings: await underlyings.list(scope) }),
    createUnderlying: ({ scope, body }) => underlyings.create(scope, body),
    readUnderlying: ({ scope, params, query }) => underlyings.detail(scope, params.underlyingId, query.bars),
    editUnderlying: ({ scope, params, body, version }) =>
      underlyings.edit(scope, { id: params.underlyingId, version, fields: body }),
    putBar: ({ scope, params, body }) =>
      bars.put(scope, { underlyingId: params.underlyingId, sessionDate: params.sessionDate, typed: body }),
  };
}
