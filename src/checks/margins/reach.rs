//! How far one value may move before a check no longer passes, given as it will be printed.

use crate::solve::root;

/// What a check says of one value.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Tried {
    /// Every verdict holds, inside every clause.
    Passes,
    /// A verdict does not hold.
    Fails,
    /// A clause does not reach so far; no verdict fails.
    Outside,
}

/// How finely a value is printed.
#[derive(Clone, Copy, Debug)]
pub enum Step {
    /// In steps of this.
    Even(f64),
    /// Three digits.
    Digits,
}

impl Step {
    /// The step at a value.
    pub fn at(self, x: f64) -> f64 {
        match self {
            Self::Even(step) => step,
            Self::Digits if x > 0.0 => 10f64.powf(x.log10().floor() - 2.0),
            Self::Digits => 1e-2,
        }
    }
}

/// How far a value may move, in the unit of its print.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Reach {
    /// The last value that passes as it is printed; that from which the search began where not even one step is left.
    pub value: f64,
    /// At least one step of print is left.
    pub moved: bool,
    /// The search ended there, not the check.
    pub end: bool,
    /// What the check says one step of print further.
    pub beyond: Tried,
}

/// From `now` towards `end`, in `steps` even steps and then by halving: the last value up to which the check passes
/// without a gap at any step, rounded back to what is printed. `None` where `now` does not pass.
pub fn reach(tried: impl Fn(f64) -> Tried, now: f64, end: f64, steps: u32, print: Step) -> Option<Reach> {
    let way = if end < now { -1.0 } else { 1.0 };
    let passes = |x: f64| tried(x) == Tried::Passes;
    let span = (end - now).abs();
    let step = print.at(end.min(now));
    let moved = root::greatest(|d| passes(now + way * d), 0.0, span, steps, step / 64.0)?;
    if moved >= span {
        return Some(Reach { value: end, moved: true, end: true, beyond: Tried::Passes });
    }
    let last = now + way * moved;
    let step = print.at(last);
    // Back to a value of print; a hair is no step.
    let mut n = if way > 0.0 { (last / step + 1e-9).floor() } else { (last / step - 1e-9).ceil() };
    let further = (n + way) * step;
    if passes(further) && (further - last).abs() <= step {
        n += way;
    }
    while (n * step - now) * way > 0.0 && !passes(n * step) {
        n -= way;
    }
    let stays = (n * step - now) * way <= 0.0;
    let value = if stays { now } else { n * step };
    let next = if stays { way.mul_add(step, now) } else { (n + way) * step };
    Some(Reach { value, moved: !stays, end: false, beyond: tried(next) })
}

#[cfg(test)]
mod tests {
    use super::*;

    fn up_to(limit: f64) -> impl Fn(f64) -> Tried {
        move |x| if x <= limit { Tried::Passes } else { Tried::Fails }
    }

    #[test]
    fn what_is_printed_passes_and_one_step_more_does_not() {
        for limit in [1.2345, 9.999, 10.0, 10.04, 57.0, 99.96, 123.9] {
            let r = reach(up_to(limit), 1.0, 200.0, 40, Step::Digits).expect("it passes");
            let step = Step::Digits.at(limit);
            assert!(r.value <= limit && r.value + step > limit, "{limit}: {r:?}");
            assert_eq!((r.end, r.beyond), (false, Tried::Fails));
        }
        let down = |x: f64| if x >= 41.3 { Tried::Passes } else { Tried::Outside };
        let r = reach(down, 100.0, 1.0, 40, Step::Even(1.0)).expect("it passes");
        assert_eq!(r, Reach { value: 42.0, moved: true, end: false, beyond: Tried::Outside });
    }

    #[test]
    fn what_has_no_step_left_stays_and_what_never_fails_ends() {
        let r = reach(up_to(1.2345), 1.2341, 5.0, 40, Step::Digits).expect("it passes");
        assert_eq!((r.value, r.moved, r.beyond), (1.2341, false, Tried::Fails));
        let r = reach(|_| Tried::Passes, 1.0, 5.0, 40, Step::Digits).expect("it passes");
        assert!(r.end && (r.value - 5.0).abs() < 1e-12);
        assert_eq!(reach(up_to(0.5), 1.0, 5.0, 40, Step::Digits), None);
    }

    /// What lies behind a gap is not counted.
    #[test]
    fn a_gap_ends_it() {
        let holed = |x: f64| if (2.0..3.0).contains(&x) { Tried::Fails } else { Tried::Passes };
        let r = reach(holed, 1.0, 9.0, 40, Step::Digits).expect("it passes");
        assert!(r.value < 2.0 && r.value > 1.98, "{r:?}");
    }
}
