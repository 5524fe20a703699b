import { DefaultNamingStrategy, type NamingStrategyInterface, type Table, type View } from 'typeorm'

function toSnakeCase(name: string): string {
  return name.replace(/[A-Z]/g, (letter) => `_${letter.toLowerCase()}`)
}

function nameOf(table: Table | View | string): string {
  const name = typeof table === 'string' ? table : table.name
  return name.split('.').at(-1) ?? name
}

/** Names columns in snake_case, and constraints and indexes as PostgreSQL names them itself, so that migrations stay plain SQL. */
export class PostgresNaming extends DefaultNamingStrategy implements NamingStrategyInterface {
  override columnName(propertyName: string, customName: string | undefined): string {
    return customName ?? toSnakeCase(propertyName)
  }
  override primaryKeyName(table: Table | string): string {
    return `${nameOf(table)}_pkey`
  }
  override uniqueConstraintName(table: Table | string, columnNames: string[]): string {
    return `${nameOf(table)}_${columnNames.join('_')}_key`
  }
  override foreignKeyName(table: Table | string, columnNames: string[]): string {
    return `${nameOf(table)}_${columnNames.join('_')}_fkey`
  }
  override indexName(table: Table | View | string, columnNames: string[]): string {
    return `${nameOf(table)}_${columnNames.join('_')}_idx`
  }
}
