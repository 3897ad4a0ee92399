/** The tables of the store. Times are milliseconds since 1970-01-01 UTC. */
export interface Tables {
  cases: {
    id: string;
    /** Of the newest revision, so that the list needs no body. */
    title: string;
    reference: string;
    /** The number of the newest revision, from 1. */
    revision: number;
    created: number;
    changed: number;
    /** When the case was deleted; it can be restored. null: it stands. */
    deleted: number | null;
    /** 1 for a case that came with the program. */
    example: number;
  };
  /** Never rewritten and never removed: triggers refuse both. */
  revisions: {
    case_id: string;
    revision: number;
    /** SHA-256 of the body. */
    sha256: string;
    /** The canonical text of the case (RFC 8785). */
    body: string;
    created: number;
  };
  /** One row, written to find out whether the store can be written. */
  probe: { id: number; at: number };
}
