//! The sheet of each panel, before and after the removal.

use super::panels::bracket::Effort;
use super::panels::{self, PanelModel};
use super::{Job, Section, masonry, panel_brings, panel_cracks, panel_views};
use crate::building::{Building, Edge as Held, Panel, Return};
use crate::sketch::Wind;
use crate::standards::masonry::Edge;
use crate::trace::{Outside, Sheet, Unshown};

/// One section a panel.
pub fn sections(job: &Job<'_>) -> Vec<Section> {
    job.building.panels.iter().map(|p| section(job, p)).collect()
}

/// Hold points that the panels bring, each with its mark.
pub fn holds(job: &Job<'_>) -> Vec<(String, String)> {
    let of = |p: &Panel| {
        let texts = model(job, p).map(|m| panels::hold_points(&m)).unwrap_or_default();
        texts.into_iter().map(|t| (p.mark.clone(), t)).collect::<Vec<_>>()
    };
    job.building.panels.iter().flat_map(of).collect()
}

fn section(job: &Job<'_>, p: &Panel) -> Section {
    let mut sheet = Sheet::recorder();
    let mut drawings = Vec::new();
    match model(job, p) {
        Ok(m) => {
            let name = |kind: &str| format!("{}-{kind}", p.mark);
            sheet.drawings(&[&name("before"), &name("after")]);
            leaning(job, p, &mut sheet);
            panels::check(&mut sheet, &m, &job.annex);
            panel_brings::to_returns(job, p, &m, &mut sheet);
            // After the check, which has the leaves analysed on all cores: here they are only remembered.
            let cracks = job.drawings(|| panel_cracks::drawings(p, &m, &job.annex));
            super::named(&mut sheet, &cracks);
            sheet.drawings(&[&name("section")]);
            let off = p.wind.is_none() && job.wind.as_ref().is_ok_and(|w| w.off_panel(p));
            let wind = if off { Wind::Away } else { Wind::Toward };
            drawings = job.drawings(|| panel_views::drawings(job.building, p, &m, wind));
            drawings.extend(cracks);
        }
        Err(outside) => sheet.leave(outside),
    }
    let leans = named(job, p).map(|r| r.mark.clone()).collect();
    Section { id: p.mark.clone(), mark: p.mark.clone(), title: p.title.clone(), sheet, drawings, leans }
}

/// Whether the edge is held, and its reason names `mark`.
pub(super) fn names(e: &Held, mark: &str) -> bool {
    let word = |c: char| !c.is_alphanumeric() && c != '-' && c != '_';
    e.kind != Edge::Free && e.reason.split(word).any(|word| word == mark)
}

/// Returns that the edges of a panel name after the removal.
pub(super) fn named<'a>(job: &'a Job<'_>, p: &'a Panel) -> impl Iterator<Item = &'a Return> {
    let edges = [&p.after.top, &p.after.base, &p.after.left, &p.after.right];
    job.building.returns.iter().filter(move |r| edges.iter().any(|e| names(e, &r.mark)))
}

/// A panel is held no better than the returns that its edges name.
fn leaning(job: &Job<'_>, p: &Panel, s: &mut Sheet) {
    for r in named(job, p).filter(|r| job.failing.contains(&r.mark)) {
        s.unshown(Unshown {
            id: format!("leans-{}", r.mark),
            clause: "statics".to_owned(),
            words: format!("support by {}", r.mark),
            finding: format!(
                "An edge of this panel is held by {}, which is not adequate on its own sheet.",
                r.mark
            ),
            ratio: None,
            hold: None,
        });
    }
    for r in named(job, p).filter(|r| job.outside.contains(&r.mark)) {
        let words = format!(
            "an edge of this panel is held by {}, which its own sheet leaves outside the method",
            r.mark
        );
        s.leave(Outside::new(&format!("leans-{}", r.mark), "statics", words));
    }
}

/// The model of a panel, strengths derived silently: they stand on the materials sheet.
pub fn model(job: &Job<'_>, p: &Panel) -> Result<PanelModel, Outside> {
    let b = job.building;
    let wind = job.wind.clone()?;
    let missing = || Outside::new("build-up", "job file", "the build-up is not given");
    let build_up = b.build_up(&p.build_up).ok_or_else(missing)?;
    let mut leaves = Vec::new();
    for leaf in &build_up.leaves {
        let material = b.material(&leaf.material).ok_or_else(missing)?;
        leaves.push(masonry::derive(
            &mut Sheet::silent(),
            b,
            &job.annex,
            material,
            build_up,
            leaf.thickness,
        )?);
    }
    let m = panels::model(b, p, &leaves, wind.of_panel(p), "wind sheet").ok_or_else(missing)?;
    let effort = if job.drawn { Effort::Read } else { Effort::Decide };
    Ok(PanelModel { strengths_on: same_leaves(b, p), effort, ..m })
}

/// The first panel before this one with the same wall, height and load: its sheet has the strengths.
fn same_leaves(b: &Building, p: &Panel) -> Option<String> {
    let same = |o: &&Panel| {
        o.build_up == p.build_up
            && o.height == p.height
            && o.dead_above == p.dead_above
            && o.lift_above == p.lift_above
            && o.route == p.route
    };
    b.panels.iter().take_while(|o| o.mark != p.mark).find(same).map(|o| o.mark.clone())
}
