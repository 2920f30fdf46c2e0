//! Which way a panel spans, and what a leaf takes that way.

use super::bracket::{self, Bounds};
use super::model::PanelModel;
use super::strength::Strength;
use crate::building::{PanelRoute, Span};
use crate::quantity::functions::sq;
use crate::quantity::{Force, Length, Num, Stress};
use crate::standards::en1996::lateral::{coefficient, span};
use crate::standards::tables::annex_e::{Edge, Edges};
use crate::trace::{Outside, Sheet};
use crate::{calc, given, verify};

/// How a panel carries the wind in bending.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Form {
    /// Both ways, Annex E.
    Plate,
    /// Between top and base.
    Vertical,
    /// Between the vertical edges.
    Horizontal,
    /// Held at its base alone.
    Cantilever,
    /// As limit analysis finds.
    Limit,
}

impl Form {
    /// Its name, also the first part of verdict ids.
    pub const fn id(self) -> &'static str {
        match self {
            Self::Plate => "flexure",
            Self::Vertical => "vertical",
            Self::Horizontal => "horizontal",
            Self::Cantilever => "cantilever",
            Self::Limit => "limit",
        }
    }

    /// In words.
    pub const fn words(self) -> &'static str {
        match self {
            Self::Plate => "spanning both ways",
            Self::Vertical => "spanning between top and base",
            Self::Horizontal => "spanning between its vertical edges",
            Self::Cantilever => "held at its base alone",
            Self::Limit => "as limit analysis finds",
        }
    }

    /// The form of a panel by the route named and its edges.
    ///
    /// # Errors
    /// [`Outside`] where these edges carry nothing by a way this check knows.
    pub fn of(route: PanelRoute, edges: Edges, id: &str) -> Result<Self, Outside> {
        let Edges { top, base, left, right } = edges;
        let held = |e: Edge| e != Edge::Free;
        let floors = held(top) && held(base);
        let sides = held(left) && held(right);
        if route == PanelRoute::LimitAnalysis {
            return Ok(Self::Limit);
        }
        if route == PanelRoute::OneWay {
            return if floors {
                Ok(Self::Vertical)
            } else {
                Err(Outside::new(
                    id,
                    "statics",
                    "a span between top and base needs both held; one is free here",
                ))
            };
        }
        match [top, base, left, right].into_iter().filter(|&e| held(e)).count() {
            3.. => Ok(Self::Plate),
            2 if floors => Ok(Self::Vertical),
            2 if sides => Ok(Self::Horizontal),
            1 if base == Edge::Continuous => Ok(Self::Cantilever),
            1 if held(base) => Err(Outside::new(
                id,
                "5.5.5",
                "held at its base alone, and the base is not continuous: nothing keeps it upright",
            )),
            _ => Err(Outside::new(
                id,
                "5.5.5",
                "two edges that meet, or one that is not the base, hold the panel: no way of spanning is known",
            )),
        }
    }
}

/// What one leaf does in one state.
#[derive(Clone, Debug, Default, PartialEq)]
pub struct LeafOutcome {
    /// Letter of Annex E, or how the panel spans.
    pub label: String,
    /// Orthogonal ratio, where it spans both ways.
    pub mu: Option<Num>,
    /// Moment coefficient, where it spans both ways.
    pub alpha_2: Option<Num>,
    /// Moment and resistance per unit length, parallel to the bed joints; single leaf only for the moment.
    pub parallel: Option<(Force, Force)>,
    /// Moment and resistance per unit height, across.
    pub across: Option<(Force, Force)>,
    /// Pressure it can take.
    pub w_Rd: Stress,
    /// By limit analysis, where that was worked.
    pub bounds: Option<Bounds>,
}

/// What is worked with: a state of the panel. `W_Ed`, `h` and `l` stand on the sheet.
#[derive(Clone, Copy, Debug)]
pub struct State<'a> {
    /// The panel.
    pub m: &'a PanelModel,
    /// Its edges.
    pub edges: Edges,
    /// How it spans.
    pub form: Form,
    /// Length.
    pub l: Length,
    /// Design pressure.
    pub W_Ed: Stress,
    /// `before` or `after`.
    pub phase: &'static str,
    /// Whether the moments of a single leaf are judged here; else only the pressure it takes is found.
    pub judged: bool,
    /// Whether another route decides: what is found here has then not the symbol of what the wall can take.
    pub beside: bool,
}

/// `w_Rd`, or `w_leaf` where there are several, from one formula.
macro_rules! by_leaf {
    ($s:expr, $state:expr, $clause:expr, $($f:tt)+) => {
        if $state.m.leaves.len() == 1 && !$state.beside {
            calc!($s, $clause, "pressure that the wall can take", w_Rd = $($f)+);
            w_Rd
        } else {
            calc!($s, $clause, "pressure that the leaf can take", w_leaf = $($f)+);
            w_leaf
        }
    };
}

/// Works one leaf without openings, or any by limit analysis: the pressure it can take, and for a single leaf the
/// moments against their resistances.
///
/// # Errors
/// [`Outside`] where the strength or the coefficient that this way of spanning needs does not exist.
pub fn leaf(
    s: &mut Sheet,
    state: State<'_>,
    span: &Span,
    strength: &Strength,
) -> Result<LeafOutcome, Outside> {
    match state.form {
        Form::Limit => bracket::sheet::leaf(s, state, span, strength),
        Form::Plate => plate(s, state, strength),
        Form::Horizontal => horizontal(s, state, strength),
        Form::Vertical | Form::Cantilever => upright(s, state, strength),
    }
}

fn id(state: State<'_>) -> String {
    format!("{}-{}", state.form.id(), state.phase)
}

fn missing(state: State<'_>) -> Outside {
    Outside::new(
        &id(state),
        "3.6.3, 5.5.5",
        "no flexural strength across the bed joints is known, so the panel cannot span sideways",
    )
}

fn plate(s: &mut Sheet, state: State<'_>, strength: &Strength) -> Result<LeafOutcome, Outside> {
    let State { m, edges, l, W_Ed, .. } = state;
    let h = m.h;
    let (resistance, ratio) = strength.across.ok_or_else(|| missing(state))?;
    let above = m.strength_from();
    // Before has the same thickness and ratio: its limits are tried without printing them twice.
    let mut quiet = Sheet::silent();
    let limits = if state.phase == "before" { &mut quiet } else { &mut *s };
    given!(limits, "actual thickness", &above, t = strength.t);
    given!(limits, "orthogonal ratio", &above, mu = ratio);
    coefficient::applies(limits, &id(state), t, mu)?;
    if state.phase == "before" {
        given!(s, "orthogonal ratio", &above, mu = ratio);
    }
    given!(s, "resistance per unit height, across the bed joints", &above, M_Rd2 = resistance);
    let found = coefficient::alpha_2(s, &id(state), edges, h, l, mu)?;
    let alpha_2 = found.alpha_2;
    let w_Rd = by_leaf!(s, state, "5.5.5(7), 6.3.1", M_Rd2 / (alpha_2 * sq(l)));
    let mut out =
        LeafOutcome { label: found.label, mu: Some(mu), alpha_2: Some(alpha_2), w_Rd, ..Default::default() };
    if m.leaves.len() == 1 && state.judged {
        given!(s, "resistance per unit length, parallel to the bed joints", &above, M_Rd1 = strength.M_Rd1);
        let moments = span::plate(s, mu, alpha_2, W_Ed, l);
        let (M_Ed1, M_Ed2) = (moments.M_Ed1, moments.M_Ed2);
        let clause = "6.3.1(2) eq. 6.14";
        verify!(s, &id(state), clause, "bending across the bed joints", M_Ed2 <= M_Rd2);
        let parallel = format!("{}-parallel-{}", state.form.id(), state.phase);
        verify!(s, &parallel, clause, "bending parallel to the bed joints", M_Ed1 <= M_Rd1);
        out.parallel = Some((M_Ed1, M_Rd1));
        out.across = Some((M_Ed2, M_Rd2));
    }
    Ok(out)
}

fn horizontal(s: &mut Sheet, state: State<'_>, strength: &Strength) -> Result<LeafOutcome, Outside> {
    let State { m, l, W_Ed, .. } = state;
    let (resistance, _) = strength.across.ok_or_else(|| missing(state))?;
    let above = m.strength_from();
    given!(s, "resistance per unit height, across the bed joints", &above, M_Rd2 = resistance);
    let w_Rd = by_leaf!(s, state, "statics, 6.3.1", 8.0 * M_Rd2 / sq(l));
    let mut out = LeafOutcome { label: state.form.words().to_owned(), w_Rd, ..Default::default() };
    if m.leaves.len() == 1 && state.judged {
        let M_Ed2 = span::horizontal(s, W_Ed, l);
        verify!(s, &id(state), "6.3.1(2) eq. 6.14", "bending across the bed joints", M_Ed2 <= M_Rd2);
        out.across = Some((M_Ed2, M_Rd2));
    }
    Ok(out)
}

fn upright(s: &mut Sheet, state: State<'_>, strength: &Strength) -> Result<LeafOutcome, Outside> {
    let State { m, W_Ed, form, .. } = state;
    let h = m.h;
    let above = m.strength_from();
    given!(s, "resistance per unit length, parallel to the bed joints", &above, M_Rd1 = strength.M_Rd1);
    let w_Rd = if form == Form::Cantilever {
        by_leaf!(s, state, "statics, 6.3.1", 2.0 * M_Rd1 / sq(h))
    } else {
        by_leaf!(s, state, "statics, 6.3.1", 8.0 * M_Rd1 / sq(h))
    };
    let mut out = LeafOutcome { label: form.words().to_owned(), w_Rd, ..Default::default() };
    if m.leaves.len() == 1 && state.judged {
        let M_Ed1 =
            if form == Form::Cantilever { span::cantilever(s, W_Ed, h) } else { span::vertical(s, W_Ed, h) };
        verify!(s, &id(state), "6.3.1(2) eq. 6.14", "bending parallel to the bed joints", M_Ed1 <= M_Rd1);
        out.parallel = Some((M_Ed1, M_Rd1));
    }
    Ok(out)
}
