import { SqlMigration } from '@/server/database/migrations/sql-migration';

export class KeepSealedForecastFromDelete extends SqlMigration {
  readonly name = 'KeepSealedForecastFromDelete1764600000019';
  protected readonly statement = `
    CREATE TRIGGER IF NOT EXISTS \`tr_sealed_forecast_delete\` BEFORE DELETE ON \`sealed_forecast\`
      FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'sealed_forecast only ever grows'
  `;
}
