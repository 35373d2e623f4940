/** Where the migrations lie; programs are started from the project's root. */
export const MIGRATIONS_FOLDER = process.env['EMBERLINE_MIGRATIONS_DIR'] ?? 'db/migrations'
