//! Results for the terminal: a line a check, then the outcome.

use super::schedule;
use crate::building::Building;
use crate::checks::Results;
use crate::checks::outcome;

/// Whether a line is about something that does not hold, so that a terminal may stress it.
pub struct Line {
    /// The text, without its line end.
    pub text: String,
    /// Something is not adequate, outside or open.
    pub stress: bool,
}

fn plain(text: impl Into<String>) -> Line {
    Line { text: text.into(), stress: false }
}

/// The results of one job as lines.
pub fn of_job(b: &Building, results: &Results) -> Vec<Line> {
    let mut out = vec![plain(format!("{}  {}", b.identity.number, b.identity.title))];
    for w in &b.warnings {
        out.push(plain(format!("  odd but possible: {w}")));
    }
    let rows_of: Vec<_> = results.sections.iter().map(schedule).collect();
    let wide = rows_of.iter().flatten().map(|r| r.check.chars().count()).max().unwrap_or(0).clamp(24, 50);
    for (s, rows) in results.sections.iter().zip(rows_of) {
        if rows.is_empty() {
            continue;
        }
        let outcome = outcome::of_sheet(&s.sheet, &s.concerns(), &results.holds);
        let name = if s.mark.is_empty() { s.title.clone() } else { format!("{}  {}", s.mark, s.title) };
        out.push(plain(""));
        let stress = outcome != outcome::Outcome::Adequate;
        out.push(Line { text: format!("{name}: {}", outcome.words()), stress });
        for r in rows {
            let check = if s.mark.contains(", ") { format!("{}, {}", r.check, r.mark) } else { r.check };
            let stress = r.verdict != "adequate";
            let text = if r.demand.is_empty() {
                let ratio = if r.ratio.is_empty() { String::new() } else { format!("{:>36}  ", r.ratio) };
                format!("  {:<wide$} {ratio}{}", check, r.verdict)
            } else if r.ratio.is_empty() {
                format!("  {:<wide$} {}", check, r.verdict)
            } else {
                let (demand, resistance) = (r.demand, r.resistance);
                format!("  {:<wide$} {demand:>12} of {resistance:>12}   {:>5}  {}", check, r.ratio, r.verdict)
            };
            out.push(Line { text, stress });
        }
    }
    let open: Vec<_> = results.holds.iter().filter(|h| h.closed.is_none()).collect();
    if !open.is_empty() {
        out.push(plain(""));
        out.push(plain("Hold points"));
        out.extend(open.iter().map(|h| plain(format!("  {}  {}", h.mark, h.text))));
    }
    out.push(plain(""));
    let stress = results.outcome != outcome::Outcome::Adequate;
    out.push(Line { text: format!("Outcome: {}", results.outcome.words()), stress });
    out
}
