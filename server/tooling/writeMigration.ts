import { writeFile } from 'node:fs/promises'
import { createDataSource } from '../database/dataSource'

const quote = (sql: string) => '`' + sql.replace(/[`\\]|\$\{/g, '\\$&') + '`'

/**
 * Writes the migration that leads from the last one to today's entities, by letting TypeORM compare
 * them on an empty in-memory database.
 * @throws when the name is not in PascalCase.
 */
export async function writeMigration(name: string | undefined): Promise<void> {
  if (!name || !/^[A-Z][A-Za-z]+$/.test(name))
    throw new Error('Give a name in PascalCase: npm run migration -- AddSignals')
  const dataSource = await createDataSource(':memory:').initialize()
  await dataSource.query('PRAGMA foreign_keys = OFF')
  await dataSource.runMigrations()
  const { upQueries, downQueries } = await dataSource.driver.createSchemaBuilder().log()
  await dataSource.destroy()
  if (upQueries.length === 0) {
    console.log('The entities and the last migration agree. Nothing to write.')
    return
  }
  const stamp = Date.now()
  // A rebuilt table takes its old name again; what refers to it must not be rewritten meanwhile.
  const body = (queries: { query: string }[]) =>
    [
      'PRAGMA legacy_alter_table = ON',
      ...queries.map(({ query }) => query),
      'PRAGMA legacy_alter_table = OFF',
    ]
      .map((query) => `    await queryRunner.query(${quote(query)})`)
      .join('\n')
  const file = `server/database/migrations/${stamp}-${name}.ts`
  await writeFile(
    file,
    `import type { MigrationInterface, QueryRunner } from 'typeorm'

export class ${name}${stamp} implements MigrationInterface {
  name = '${name}${stamp}'

  async up(queryRunner: QueryRunner): Promise<void> {
${body(upQueries)}
  }

  async down(queryRunner: QueryRunner): Promise<void> {
${body([...downQueries].reverse())}
  }
}
`,
  )
  console.log(`Wrote ${file}. Read it before you commit it.`)
}
