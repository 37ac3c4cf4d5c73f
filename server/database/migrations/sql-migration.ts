import { type MigrationInterface, type QueryRunner } from 'typeorm';

/**
 * A step forward of the schema: one statement that can be run again without harm, since MariaDB commits each by itself.
 * Name: words and a growing number, by which TypeORM keeps the order.
 */
export abstract class SqlMigration implements MigrationInterface {
  abstract readonly name: string;
  protected abstract readonly statement: string;

  async up(queryRunner: QueryRunner): Promise<void> {
    await queryRunner.query(this.statement);
  }

  /** Schemas only go forward; a wrong step is put right by the next one. */
  down(): Promise<void> {
    return Promise.reject(new Error(`${this.name} cannot be undone; write a further migration.`));
  }
}
