-- Full-text postings over search_entries; kept in step by the three triggers below.
CREATE VIRTUAL TABLE search_index USING fts5(words, content='search_entries', content_rowid='entry', tokenize='unicode61 remove_diacritics 2', prefix='1 2 3 4');
--> statement-breakpoint
CREATE VIRTUAL TABLE search_vocabulary USING fts5vocab(search_index, 'row');
--> statement-breakpoint
CREATE TRIGGER search_entries_insert AFTER INSERT ON search_entries BEGIN
  INSERT INTO search_index(rowid, words) VALUES (new.entry, new.words);
END;
--> statement-breakpoint
CREATE TRIGGER search_entries_delete AFTER DELETE ON search_entries BEGIN
  INSERT INTO search_index(search_index, rowid, words) VALUES ('delete', old.entry, old.words);
END;
--> statement-breakpoint
CREATE TRIGGER search_entries_update AFTER UPDATE ON search_entries BEGIN
  INSERT INTO search_index(search_index, rowid, words) VALUES ('delete', old.entry, old.words);
  INSERT INTO search_index(rowid, words) VALUES (new.entry, new.words);
END;
--> statement-breakpoint
-- The audit log only grows. Entries older than its keeping time leave through a job that drops the trigger inside its own transaction.
CREATE TRIGGER audit_log_no_update BEFORE UPDATE ON audit_log BEGIN
  SELECT raise(ABORT, 'the audit log is append-only');
END;
--> statement-breakpoint
CREATE TRIGGER audit_log_no_delete BEFORE DELETE ON audit_log BEGIN
  SELECT raise(ABORT, 'the audit log is append-only');
END;
