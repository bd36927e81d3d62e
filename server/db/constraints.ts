/** Whether PostgreSQL refused a statement because the named unique constraint or index holds the value already. */
export function isUniqueViolation(error: unknown, constraint: string): boolean {
  return isPostgresError(error, '23505') && 'constraint' in error && error.constraint === constraint;
}

/** Whether PostgreSQL refused a statement because the named foreign key has nothing at its other end. */
export function isForeignKeyViolation(error: unknown, constraint: string): boolean {
  return isPostgresError(error, '23503') && 'constraint' in error && error.constraint === constraint;
}

function isPostgresError(error: unknown, code: string): error is Error {
  return error instanceof Error && 'code' in error && error.code === code;
}
