import { QueryTypes } from "sequelize";
import { Database } from "sqlite3";
import { database } from "@/models/database";

/** What somebody with the file in hand can do: opens it apart, drops every trigger and runs the statements. */
export async function forge(...statements: string[]): Promise<void> {
  const select = { type: QueryTypes.SELECT } as const;
  const [main] = await database.query<{ file: string }>("PRAGMA database_list", select);
  const triggers = await database.query<{ name: string }>(
    "SELECT name FROM sqlite_master WHERE type = 'trigger'",
    select,
  );
  const drops = triggers.map(({ name }) => `DROP TRIGGER ${name}`);
  await runApart(main?.file ?? "", ["PRAGMA foreign_keys = OFF", ...drops, ...statements].join(";\n"));
}

function runApart(file: string, sql: string): Promise<void> {
  return new Promise((resolve, reject) => {
    const forger = new Database(file, (problem) => problem && reject(problem));
    forger.exec(sql, (problem) => {
      forger.close(() => (problem ? reject(problem) : resolve()));
    });
  });
}
