-- Immutable tables: rows are inserted and never change. The service code never tries; this refuses it to everybody.
CREATE TRIGGER show_versions_no_update BEFORE UPDATE ON show_versions BEGIN SELECT RAISE(ABORT, 'show_versions is insert-only'); END;
--> statement-breakpoint
CREATE TRIGGER show_versions_no_delete BEFORE DELETE ON show_versions BEGIN SELECT RAISE(ABORT, 'show_versions is insert-only'); END;
--> statement-breakpoint
CREATE TRIGGER runs_no_update BEFORE UPDATE ON runs BEGIN SELECT RAISE(ABORT, 'runs is insert-only'); END;
--> statement-breakpoint
CREATE TRIGGER runs_no_delete BEFORE DELETE ON runs BEGIN SELECT RAISE(ABORT, 'runs is insert-only'); END;
--> statement-breakpoint
CREATE TRIGGER submission_events_no_update BEFORE UPDATE ON submission_events BEGIN SELECT RAISE(ABORT, 'submission_events is insert-only'); END;
--> statement-breakpoint
CREATE TRIGGER submission_events_no_delete BEFORE DELETE ON submission_events BEGIN SELECT RAISE(ABORT, 'submission_events is insert-only'); END;
--> statement-breakpoint
CREATE TRIGGER square_layouts_no_update BEFORE UPDATE ON square_layouts BEGIN SELECT RAISE(ABORT, 'square_layouts is insert-only'); END;
--> statement-breakpoint
CREATE TRIGGER square_layouts_no_delete BEFORE DELETE ON square_layouts BEGIN SELECT RAISE(ABORT, 'square_layouts is insert-only'); END;
--> statement-breakpoint
CREATE TRIGGER beat_maps_no_update BEFORE UPDATE ON beat_maps BEGIN SELECT RAISE(ABORT, 'beat_maps is insert-only'); END;
--> statement-breakpoint
CREATE TRIGGER beat_maps_no_delete BEFORE DELETE ON beat_maps BEGIN SELECT RAISE(ABORT, 'beat_maps is insert-only'); END;
--> statement-breakpoint
CREATE TRIGGER lineup_publications_no_update BEFORE UPDATE ON lineup_publications BEGIN SELECT RAISE(ABORT, 'lineup_publications is insert-only'); END;
--> statement-breakpoint
CREATE TRIGGER lineup_publications_no_delete BEFORE DELETE ON lineup_publications BEGIN SELECT RAISE(ABORT, 'lineup_publications is insert-only'); END;
--> statement-breakpoint
CREATE TRIGGER audit_log_no_update BEFORE UPDATE ON audit_log BEGIN SELECT RAISE(ABORT, 'audit_log is insert-only'); END;
--> statement-breakpoint
CREATE TRIGGER audit_log_no_delete BEFORE DELETE ON audit_log BEGIN SELECT RAISE(ABORT, 'audit_log is insert-only'); END;
--> statement-breakpoint
CREATE TRIGGER exercise_attempts_no_update BEFORE UPDATE ON exercise_attempts BEGIN SELECT RAISE(ABORT, 'exercise_attempts is insert-only'); END;
