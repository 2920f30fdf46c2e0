//! What the job file does not speak of: returns and panels taken from the plan, on the safe side.

use super::{Found, FoundPanel, FoundReturn, FoundSpan};
use crate::building::{
    Acts, BaseJoint, Building, Cause, Edge, Flange, FloorKind, FromAbove, Head, Panel, PanelRoute, Path,
    Proof, Restraint, Return, Sharing, Span, Storey,
};
use crate::quantity::functions::max;
use crate::quantity::{LineLoad, Num};
use crate::standards::masonry;

/// Coefficient of friction at a dpc: common practice, no published source.
pub const MU_USUAL: f64 = 0.4;

/// Adds a return and a panel for everything found that the job file does not give.
pub fn complete(b: &mut Building, mut found: Found) {
    for r in &found.returns {
        let valid = r.mark.chars().all(|c| c.is_ascii_alphanumeric() || c == '-' || c == '_');
        if !valid || b.returns.iter().any(|own| own.mark == r.mark) {
            continue;
        }
        if let Some(new) = new_return(b, r) {
            found.added.push(new.mark.clone());
            b.returns.push(new);
        }
    }
    for p in &found.panels {
        if treated(b, p).is_some() {
            continue;
        }
        if let Some(new) = new_panel(b, p) {
            found.added.push(new.mark.clone());
            b.panels.push(new);
        }
    }
    b.found = found;
}

/// The panel of the job that covers at least half of a panel found.
pub fn treated<'b>(b: &'b Building, found: &FoundPanel) -> Option<&'b Panel> {
    b.panels.iter().find(|p| {
        p.on.as_ref() == Some(&found.on)
            && p.after.ends.is_none_or(|(a, z)| {
                let (c, e) = found.after.range;
                (z.base().min(e.base()) - a.base().max(c.base())) * 2.0 >= (e - c).base()
            })
    })
}

/// What holds head and foot of a wall across it, from the floor over it; not told by a roof.
pub const fn restraint(storey: &Storey) -> Option<Restraint> {
    match storey.floor_above {
        FloorKind::Timber => Some(Restraint::Timber),
        FloorKind::Concrete => Some(Restraint::Concrete),
        FloorKind::Roof => None,
    }
}

/// A junction with the wall met that is not counted.
pub fn junction(r: &FoundReturn) -> Flange {
    Flange {
        to: r.meets.clone(),
        bonded: false,
        proof: Proof::Assumed,
        words: "Not spoken of: not counted.".to_owned(),
        thickness: r.thickness,
        left: r.to_end[0],
        right: r.to_end[1],
        next_wall_left: r.to_next[0],
        next_wall_right: r.to_next[1],
        dead: LineLoad::ZERO,
        uplift: LineLoad::ZERO,
    }
}

/// A title for a return.
pub fn title_of_return(r: &FoundReturn) -> String {
    format!("Return at the {}", r.meets)
}

/// A title for a panel.
pub fn title_of_panel(p: &FoundPanel) -> String {
    let end = |i: usize| p.after.held[i].clone().unwrap_or_else(|| "its free end".to_owned());
    let mut on = p.on.chars();
    let first: String = on.next().into_iter().flat_map(char::to_uppercase).collect();
    format!("{first}{} from {} to {}", on.as_str(), end(0), end(1))
}

/// How a panel is held where the job file does not say: against moving, never against turning.
pub fn span(of: &FoundSpan, storey: &Storey) -> Span {
    let simple = |reason: String| Edge { kind: masonry::Edge::Simple, stretch: None, dpc: false, reason };
    let side = |held: &Option<String>| match held {
        Some(mark) => simple(format!("Taken from the plan: {mark} holds it against moving.")),
        None => Edge {
            kind: masonry::Edge::Free,
            stretch: None,
            dpc: false,
            reason: "Nothing on the plan holds this end.".to_owned(),
        },
    };
    let over = if storey.floor_above == FloorKind::Roof { "roof" } else { "floor" };
    Span {
        length: of.length(),
        ends: Some(of.range),
        top: simple(format!("Taken from the plan: the {over} over it holds it against moving.")),
        base: simple("Foot of the wall: held against moving.".to_owned()),
        left: side(&of.held[0]),
        right: side(&of.held[1]),
        openings: of.openings.clone(),
    }
}

fn new_return(b: &Building, r: &FoundReturn) -> Option<Return> {
    let wall = b.plan.iter().find(|w| w.mark == r.mark)?;
    let storey = b.storey(&b.removed.storey)?;
    Some(Return {
        mark: r.mark.clone(),
        title: title_of_return(r),
        build_up: wall.build_up.clone(),
        storey: storey.mark.clone(),
        length: r.length,
        height: storey.clear_height,
        position: None,
        base: BaseJoint::Dpc,
        base_reason: String::new(),
        mu: Cause { value: Num::new(MU_USUAL), reason: String::new() },
        // A cantilever that takes the wind of its panels and of its floor: what a job may say better.
        head: Head::Free,
        path: Path::Both,
        tributary_width: r.tributary,
        strip_height: Some(r.strip),
        from_above: FromAbove::default(),
        wind: None,
        restraint: restraint(storey).unwrap_or(Restraint::None),
        supported_wall_height: max(r.supported, storey.clear_height),
        nearest_opening: r.nearest_opening,
        far_end: None,
        acts: Acts::Loaded,
        loads: Vec::new(),
        junction: junction(r),
        footing: None,
    })
}

fn new_panel(b: &Building, p: &FoundPanel) -> Option<Panel> {
    let wall = b.plan.iter().find(|w| w.mark == p.on)?;
    let storey = b.storey(&b.removed.storey)?;
    let taken = |mark: &str| {
        let same = |m: &String| m.to_lowercase() == mark.to_lowercase();
        b.panels.iter().any(|x| same(&x.mark)) || b.returns.iter().any(|x| same(&x.mark))
    };
    let mark = (1..).map(|n| format!("P{n}")).find(|m| !taken(m))?;
    Some(Panel {
        mark,
        title: title_of_panel(p),
        build_up: wall.build_up.clone(),
        storey: storey.mark.clone(),
        height: storey.clear_height,
        on: Some(p.on.clone()),
        dead_above: LineLoad::ZERO,
        lift_above: LineLoad::ZERO,
        wind: None,
        route: PanelRoute::Flexure,
        sharing: Sharing::Strength,
        before: span(&p.before, storey),
        after: span(&p.after, storey),
        edges_taken: true,
        wall_at: Some(p.wall_at),
        arching: None,
    })
}
