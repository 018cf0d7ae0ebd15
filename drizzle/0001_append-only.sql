-- The books and the audit log are append-only: a mistake is taken back by a reversal, never by an update.
CREATE TRIGGER movements_no_update BEFORE UPDATE ON movements FOR EACH ROW
SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: movements rows are never changed or removed';
--> statement-breakpoint
CREATE TRIGGER movements_no_delete BEFORE DELETE ON movements FOR EACH ROW
SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: movements rows are never changed or removed';
--> statement-breakpoint
CREATE TRIGGER movement_lines_no_update BEFORE UPDATE ON movement_lines FOR EACH ROW
SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: movement_lines rows are never changed or removed';
--> statement-breakpoint
CREATE TRIGGER movement_lines_no_delete BEFORE DELETE ON movement_lines FOR EACH ROW
SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: movement_lines rows are never changed or removed';
--> statement-breakpoint
CREATE TRIGGER entries_no_update BEFORE UPDATE ON entries FOR EACH ROW
SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: entries rows are never changed or removed';
--> statement-breakpoint
CREATE TRIGGER entries_no_delete BEFORE DELETE ON entries FOR EACH ROW
SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: entries rows are never changed or removed';
--> statement-breakpoint
CREATE TRIGGER postings_no_update BEFORE UPDATE ON postings FOR EACH ROW
SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: postings rows are never changed or removed';
--> statement-breakpoint
CREATE TRIGGER postings_no_delete BEFORE DELETE ON postings FOR EACH ROW
SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: postings rows are never changed or removed';
--> statement-breakpoint
CREATE TRIGGER audit_log_no_update BEFORE UPDATE ON audit_log FOR EACH ROW
SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: audit_log rows are never changed or removed';
--> statement-breakpoint
CREATE TRIGGER audit_log_no_delete BEFORE DELETE ON audit_log FOR EACH ROW
SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: audit_log rows are never changed or removed';
--> statement-breakpoint
-- A closed month takes no more postings, whoever writes them.
CREATE TRIGGER postings_month_open BEFORE INSERT ON postings FOR EACH ROW
BEGIN
  IF EXISTS (SELECT 1 FROM months m WHERE m.outfit_id = NEW.outfit_id AND m.month = DATE_FORMAT(NEW.occurred_on, '%Y-%m') AND m.closed_at IS NOT NULL) THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'closed-month: this month takes no more postings';
  END IF;
END;
--> statement-breakpoint
CREATE TRIGGER movement_lines_month_open BEFORE INSERT ON movement_lines FOR EACH ROW
BEGIN
  IF EXISTS (SELECT 1 FROM months m WHERE m.outfit_id = NEW.outfit_id AND m.month = DATE_FORMAT(NEW.occurred_on, '%Y-%m') AND m.closed_at IS NOT NULL) THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'closed-month: this month takes no more movements';
  END IF;
END;
