import { DefaultNamingStrategy } from 'typeorm';

const snakeCase = (name: string) => name.replace(/([a-z0-9])([A-Z])/g, '$1_$2').toLowerCase();

/** Columns are snake_case in the database, camelCase in the code: `siteId` is `site_id`. */
export class SnakeCaseNaming extends DefaultNamingStrategy {
  override columnName(propertyName: string, customName: string, prefixes: string[]): string {
    return snakeCase([...prefixes, customName || propertyName].join('_'));
  }

  override relationName(propertyName: string): string {
    return snakeCase(propertyName);
  }

  override joinColumnName(relationName: string, referencedColumnName: string): string {
    return snakeCase(`${relationName}_${referencedColumnName}`);
  }
}
