//! Roots and thresholds by bisection: slow, certain, the same on every machine.

/// A root of `f` between `low` and `high`, to the last bit that halving can give. `None` where `f`
/// has one sign at both ends or is undefined.
pub fn bisect(f: impl Fn(f64) -> f64, mut low: f64, mut high: f64) -> Option<f64> {
    let (at_low, at_high) = (f(low), f(high));
    if at_low == 0.0 {
        return Some(low);
    }
    if at_low.is_nan() || at_high.is_nan() || (at_low > 0.0) == (at_high > 0.0) {
        return None;
    }
    for _ in 0..200 {
        let middle = low + (high - low) / 2.0;
        if middle <= low || middle >= high {
            break;
        }
        if (f(middle) > 0.0) == (at_low > 0.0) {
            low = middle;
        } else {
            high = middle;
        }
    }
    Some(high)
}

/// The least `x` between `low` and `high` at which `passes` holds, looked for on `steps` even steps and
/// then by halving to `precision`. What is returned passes. `None` where no step passes.
pub fn least(passes: impl Fn(f64) -> bool, low: f64, high: f64, steps: u32, precision: f64) -> Option<f64> {
    if passes(low) {
        return Some(low);
    }
    let at = |i: u32| low + (high - low) * f64::from(i) / f64::from(steps);
    let first = (1..=steps).find(|&i| passes(at(i)))?;
    let (mut fails, mut works) = (at(first - 1), at(first));
    while works - fails > precision {
        let middle = fails + (works - fails) / 2.0;
        if passes(middle) {
            works = middle;
        } else {
            fails = middle;
        }
    }
    Some(works)
}

/// The largest `x` between `low` and `high` up to which `passes` holds without a gap at any step.
pub fn greatest(
    passes: impl Fn(f64) -> bool,
    low: f64,
    high: f64,
    steps: u32,
    precision: f64,
) -> Option<f64> {
    if !passes(low) {
        return None;
    }
    let at = |i: u32| low + (high - low) * f64::from(i) / f64::from(steps);
    let Some(first) = (1..=steps).find(|&i| !passes(at(i))) else { return Some(high) };
    let (mut works, mut fails) = (at(first - 1), at(first));
    while fails - works > precision {
        let middle = works + (fails - works) / 2.0;
        if passes(middle) {
            works = middle;
        } else {
            fails = middle;
        }
    }
    Some(works)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn bisection_finds_the_square_root_of_two() {
        let x = bisect(|x| x * x - 2.0, 0.0, 2.0).expect("signs differ");
        assert!((x - std::f64::consts::SQRT_2).abs() < 1e-15);
        assert!(bisect(|x| x * x + 1.0, 0.0, 2.0).is_none());
    }

    #[test]
    fn what_a_search_returns_passes() {
        let p = |x: f64| x >= 3.3;
        let x = least(p, 0.0, 10.0, 10, 1e-6).expect("ten passes");
        assert!(p(x) && x - 3.3 < 1e-5);
        let y = greatest(|x| x <= 7.7, 0.0, 10.0, 10, 1e-6).expect("zero passes");
        assert!(y <= 7.7 && 7.7 - y < 1e-5);
        assert!(least(|_| false, 0.0, 1.0, 10, 1e-3).is_none());
    }
}
