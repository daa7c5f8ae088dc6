import type { DataSource } from 'typeorm';

/** Whether the database answers and has every migration this build knows. */
export async function isSchemaReady(dataSource: DataSource): Promise<boolean> {
  try {
    return !(await dataSource.showMigrations());
  } catch {
    // Whatever keeps the database from answering, the answer to "ready?" is no; requests report the cause themselves.
    return false;
  }
}
