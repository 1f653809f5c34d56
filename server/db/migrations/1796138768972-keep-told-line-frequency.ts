import type { MigrationInterface, QueryRunner } from 'typeorm';

/** The line frequency a file tells: it stands in where the register says none. */
export class KeepToldLineFrequency1796138768972 implements MigrationInterface {
  name = 'KeepToldLineFrequency1796138768972';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query('ALTER TABLE `waveform` ADD COLUMN `told_line_frequency_hz` double NULL');
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('ALTER TABLE `waveform` DROP COLUMN `told_line_frequency_hz`');
  }
}
