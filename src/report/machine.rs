//! Results as JSON, for other programs. The field names are part of the tool's interface.

use serde_json::{Value as Json, json};

use super::schedule;
use crate::building::Building;
use crate::checks::{Results, outcome};
use crate::error::Report;

/// The results of one job file.
pub fn of_job(file: &str, b: &Building, results: &Results) -> Json {
    let sections: Vec<Json> = results
        .sections
        .iter()
        .filter(|s| !s.mark.is_empty() || s.sheet.judges())
        .map(|s| {
            let o = outcome::of_sheet(&s.sheet, &s.concerns(), &results.holds);
            let checks: Vec<Json> = s
                .sheet
                .verdicts
                .iter()
                .zip(schedule(s))
                .map(|(v, row)| {
                    json!({
                        "id": v.id, "check": v.words, "clause": v.clause, "case": v.case,
                        "demand": row.demand, "resistance": row.resistance,
                        "ratio": if v.ratio.is_finite() { json!(v.ratio) } else { Json::Null },
                        "ratio_printed": row.ratio, "verdict": row.verdict,
                    })
                })
                .collect();
            let outside: Vec<Json> = s
                .sheet
                .outside
                .iter()
                .map(|o| json!({"id": o.id, "clause": o.clause, "words": o.words}))
                .collect();
            let unshown: Vec<Json> = s
                .sheet
                .unshown
                .iter()
                .map(|u| json!({"id": u.id, "clause": u.clause, "words": u.words, "finding": u.finding, "ratio": u.ratio.filter(|r| r.is_finite()), "hold_point": u.hold}))
                .collect();
            json!({
                "id": s.id, "title": s.title, "outcome": o.kind(), "words": o.words(),
                "checks": checks, "outside": outside, "not_shown": unshown,
            })
        })
        .collect();
    let holds: Vec<Json> = results
        .holds
        .iter()
        .map(|h| json!({"mark": h.mark, "text": h.text, "for": h.of, "closed": h.closed}))
        .collect();
    json!({
        "file": file, "job": b.identity.number,
        "outcome": results.outcome.kind(), "words": results.outcome.words(),
        "warnings": b.warnings, "hold_points": holds, "sheets": sections,
    })
}

/// A job file that cannot be used.
pub fn of_report(file: &str, report: &Report) -> Json {
    json!({"file": file, "outcome": "error", "diagnostics": report.records()})
}

/// A file that cannot be read, or a fault of the tool.
pub fn of_error(file: &str, error: &crate::error::Error) -> Json {
    json!({"file": file, "outcome": "error", "message": error.to_string()})
}
