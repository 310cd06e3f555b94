import pg from "pg";
import { Sequelize } from "sequelize";

/** Connects Sequelize to PostgreSQL. `poolMax` is 1 in tests, so that a call that forgot its transaction times out instead of lying. */
export function connect(url: string, { poolMax = 10 }: { poolMax?: number } = {}): Sequelize {
  return new Sequelize(url, {
    dialect: "postgres",
    dialectModule: pg,
    logging: false,
    pool: { max: poolMax, idle: 10_000, acquire: 15_000 },
    define: { underscored: true, timestamps: false },
  });
}
