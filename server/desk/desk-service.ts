import { type DeskScope } from '@/server/database/desk-scope';
import { type DeskStore } from '@/server/desk/desk-store';
import { ConflictError } from '@/server/errors/conflict-error';
import { NotFoundError } from '@/server/errors/not-found-error';
import { toDecimal, toDecimalText } from '@/journal/money/decimal';
import { type Desk } from '@/shared/desk/desk-endpoints';
import { type DeskSettings } from '@/shared/desk/desk-settings';

/** Settings and members of a desk. */
export class DeskService {
  constructor(private readonly desks: DeskStore) {}

  async settings(scope: DeskScope): Promise<DeskSettings> {
    const desk = await this.desks.find(scope.deskId);
    if (desk === null) throw new NotFoundError();
    const { name, currency, ratePerYear, overnightShare, version } = desk;
    // The column keeps six places; a person typed two.
    return {
      name,
      currency,
      ratePerYear,
      overnightShare,
      feePerContract: toDecimalText(toDecimal(desk.feePerContract)),
      version,
    };
  }

  async read(scope: DeskScope): Promise<Desk> {
    return { settings: await this.settings(scope), members: await this.desks.members(scope.deskId) };
  }

  async edit(scope: DeskScope, version: number, settings: Omit<DeskSettings, 'version'>): Promise<Desk> {
    const isWritten = await this.desks.replaceSettings(scope.deskId, version, settings);
    if (!isWritten)
      throw new ConflictError('changed-elsewhere', 'Someone else changed these settings.', [], await this.read(scope));
    return this.read(scope);
  }
}
