/** One step of the schema: SQL statements that take it forward and back, run in order. */
export interface Migration {
  name: string;
  up: string[];
  down: string[];
}
