-- Makes the two roles and the database of Emberline, or brings them up to date; safe to run again.
-- For psql 15 or newer, signed in as a superuser:
--   EMBERLINE_DATABASE=emberline EMBERLINE_OWNER_PASSWORD=… EMBERLINE_SERVER_PASSWORD=… \
--     psql -X -d postgres -f db/provisioning/provision.sql
\set ON_ERROR_STOP on
\getenv database EMBERLINE_DATABASE
\getenv owner_password EMBERLINE_OWNER_PASSWORD
\getenv server_password EMBERLINE_SERVER_PASSWORD

-- Passwords stay out of the cluster's log, whatever it is set to note.
SET log_statement = 'none';
SET log_min_error_statement = 'panic';
SET log_min_duration_statement = -1;

SELECT format('CREATE ROLE %I', name)
FROM (VALUES ('emberline_owner'), ('emberline_server')) AS wanted (name)
WHERE NOT EXISTS (SELECT FROM pg_roles WHERE rolname = name)
\gexec

-- Row-level security and the triggers that keep revisions as they are bind the server's role only as long as it is
-- no superuser, bypasses nothing and owns nothing.
ALTER ROLE emberline_owner
  LOGIN NOSUPERUSER NOCREATEDB NOCREATEROLE NOREPLICATION NOBYPASSRLS PASSWORD :'owner_password';
ALTER ROLE emberline_server
  LOGIN NOSUPERUSER NOCREATEDB NOCREATEROLE NOREPLICATION NOBYPASSRLS PASSWORD :'server_password';

SELECT format('CREATE DATABASE %I OWNER emberline_owner TEMPLATE template0 ENCODING %L', :'database', 'UTF8')
WHERE NOT EXISTS (SELECT FROM pg_database WHERE datname = :'database')
\gexec

REVOKE ALL ON DATABASE :"database" FROM PUBLIC;
GRANT CONNECT ON DATABASE :"database" TO emberline_server;
