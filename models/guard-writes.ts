import type { Sequelize } from "sequelize";

const WRITE = /^\s*(?:insert|update|delete|replace|create|drop|alter)\b/i;

/**
 * A write outside a transaction would run on the one shared connection, commit by itself without its history entry,
 * and keep every read behind it waiting while another transaction holds the lock. It is a bug, so it throws.
 */
export function guardWrites(sequelize: Sequelize): void {
  const original = sequelize.query;
  sequelize.query = new Proxy(original, {
    apply(target, thisArgument, parameters: unknown[]) {
      const [statement, options] = parameters;
      if (WRITE.test(textOf(statement)) && !hasTransaction(options)) {
        return Promise.reject(new Error(`A write needs a transaction: ${textOf(statement).slice(0, 80)}`));
      }
      return Reflect.apply(target, thisArgument, parameters);
    },
  });
}

function textOf(statement: unknown): string {
  if (typeof statement === "string") return statement;
  if (typeof statement === "object" && statement !== null && "query" in statement) return String(statement.query);
  return "";
}

function hasTransaction(options: unknown): boolean {
  return typeof options === "object" && options !== null && "transaction" in options && Boolean(options.transaction);
}
