import { sqlMigration } from './migration.js';

export const accounts = sqlMigration(
  '0001-accounts',
  `
  CREATE EXTENSION IF NOT EXISTS btree_gist;
  CREATE EXTENSION IF NOT EXISTS intarray;

  CREATE TABLE organizations (
    id uuid PRIMARY KEY,
    name text NOT NULL CHECK (length(name) BETWEEN 1 AND 120),
    kind text NOT NULL CHECK (kind IN ('builder', 'plumber', 'department')),
    phone text,
    created_at timestamptz NOT NULL,
    UNIQUE (kind, name)
  );

  CREATE TABLE persons (
    id uuid PRIMARY KEY,
    email text NOT NULL UNIQUE CHECK (email = lower(email)),
    name text NOT NULL,
    phone text,
    password_hash text,
    locale text NOT NULL DEFAULT 'en' CHECK (locale IN ('en', 'es')),
    units text NOT NULL DEFAULT 'us' CHECK (units IN ('us', 'metric')),
    is_operator boolean NOT NULL DEFAULT false,
    is_disabled boolean NOT NULL DEFAULT false,
    created_at timestamptz NOT NULL
  );

  CREATE TABLE memberships (
    id uuid PRIMARY KEY,
    person_id uuid NOT NULL REFERENCES persons (id),
    organization_id uuid NOT NULL REFERENCES organizations (id),
    roles text[] NOT NULL CHECK (cardinality(roles) > 0
      AND roles <@ ARRAY['superintendent', 'plumber', 'helper', 'inspector', 'desk', 'owner']),
    is_disabled boolean NOT NULL DEFAULT false,
    created_at timestamptz NOT NULL,
    UNIQUE (person_id, organization_id)
  );
  CREATE INDEX memberships_organization ON memberships (organization_id);

  CREATE TABLE sessions (
    id uuid PRIMARY KEY,
    person_id uuid NOT NULL REFERENCES persons (id),
    created_at timestamptz NOT NULL,
    expires_at timestamptz NOT NULL,
    ended_at timestamptz,
    end_reason text CHECK (end_reason IN ('signed-out', 'signed-out-everywhere', 'reused', 'password-changed', 'disabled'))
  );
  CREATE INDEX sessions_person ON sessions (person_id) WHERE ended_at IS NULL;

  CREATE TABLE refresh_tokens (
    id uuid PRIMARY KEY,
    session_id uuid NOT NULL REFERENCES sessions (id),
    token_hash text NOT NULL UNIQUE,
    created_at timestamptz NOT NULL,
    replaced_at timestamptz
  );
  CREATE INDEX refresh_tokens_session ON refresh_tokens (session_id);
  CREATE UNIQUE INDEX refresh_tokens_one_current ON refresh_tokens (session_id) WHERE replaced_at IS NULL;

  CREATE TABLE invitations (
    id uuid PRIMARY KEY,
    organization_id uuid REFERENCES organizations (id),
    email text NOT NULL CHECK (email = lower(email)),
    name text NOT NULL,
    roles text[] NOT NULL,
    is_operator boolean NOT NULL DEFAULT false,
    invited_by uuid REFERENCES persons (id),
    created_at timestamptz NOT NULL,
    expires_at timestamptz NOT NULL,
    accepted_at timestamptz,
    withdrawn_at timestamptz,
    CHECK ((organization_id IS NULL) = is_operator)
  );
  CREATE INDEX invitations_organization ON invitations (organization_id);
  CREATE UNIQUE INDEX invitations_one_open ON invitations (organization_id, email)
    WHERE accepted_at IS NULL AND withdrawn_at IS NULL;

  CREATE TABLE link_tokens (
    id uuid PRIMARY KEY,
    kind text NOT NULL CHECK (kind IN ('sign-in', 'reset', 'invitation')),
    token_hash text NOT NULL UNIQUE,
    person_id uuid REFERENCES persons (id),
    invitation_id uuid REFERENCES invitations (id),
    created_at timestamptz NOT NULL,
    expires_at timestamptz NOT NULL,
    used_at timestamptz,
    CHECK ((kind = 'invitation') = (invitation_id IS NOT NULL))
  );
  CREATE INDEX link_tokens_person ON link_tokens (person_id);
  CREATE INDEX link_tokens_invitation ON link_tokens (invitation_id);

  CREATE TABLE sign_in_failures (
    id bigserial PRIMARY KEY,
    account_hash text NOT NULL,
    address_hash text NOT NULL,
    at timestamptz NOT NULL
  );
  CREATE INDEX sign_in_failures_lookup ON sign_in_failures (account_hash, address_hash, at);
  `,
  `
  DROP TABLE sign_in_failures, link_tokens, invitations, refresh_tokens, sessions, memberships, persons, organizations;
  `,
);
