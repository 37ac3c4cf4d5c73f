import { SqlMigration } from '@/server/database/migrations/sql-migration';

export class KeepSealedForecastFromUpdate extends SqlMigration {
  readonly name = 'KeepSealedForecastFromUpdate1764600000018';
  protected readonly statement = `
    CREATE TRIGGER IF NOT EXISTS \`tr_sealed_forecast_update\` BEFORE UPDATE ON \`sealed_forecast\`
      FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'sealed_forecast only ever grows'
  `;
}
