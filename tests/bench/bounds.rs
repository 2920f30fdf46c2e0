//! The limit analyses of a panel of 4.0 x 2.6 m with a window and a door, by the fineness of their grids.

use divan::{Bencher, black_box};
use perpend::solve::plate::elastic::{PATCH, first_crack};
use perpend::solve::plate::safe::safe;
use perpend::solve::plate::upper::{pattern, upper};
use perpend::solve::plate::{Carry, Held, Opening, Plate, Stretch};

fn panel() -> Plate<'static> {
    let all = |to: f64, held: Held| vec![Stretch { from: 0.0, to, held }];
    let (l, h) = (4000.0, 2600.0);
    let window = Opening { x: (500.0, 1700.0), y: (900.0, 2100.0), carry: Carry::AllRound };
    let door = Opening { x: (2500.0, 3400.0), y: (0.0, 2100.0), carry: Carry::Jambs };
    let simple = Held::Simple;
    Plate {
        l,
        h,
        openings: vec![window, door],
        edges: [all(h, simple), all(h, Held::Continuous(400.0)), all(l, simple), all(l, simple)],
        m_H: 1000.0,
        m_V: &|_, y| 350.0 + 0.05 * (2600.0 - y),
    }
}

/// The safe side, parts of the longer side.
#[divan::bench(args = [8, 12, 16, 24, 32, 48, 64], max_time = 10)]
fn safe_side(bencher: Bencher<'_, '_>, parts: u32) {
    let plate = panel();
    bencher.bench_local(|| safe(black_box(&plate), 4000.0 / f64::from(parts)).expect("it is held").pressure);
}

/// The upper side.
#[divan::bench(args = [8, 10, 12, 16, 20], max_time = 10)]
fn upper_side(bencher: Bencher<'_, '_>, parts: u32) {
    let plate = panel();
    bencher.bench_local(|| upper(black_box(&plate), 4000.0 / f64::from(parts)).expect("it is held").pressure);
}

/// The clean crack pattern.
#[divan::bench(args = [12, 16, 20], max_time = 10)]
fn crack_pattern(bencher: Bencher<'_, '_>, parts: u32) {
    let plate = panel();
    bencher.bench_local(|| pattern(black_box(&plate), 4000.0 / f64::from(parts)).expect("it is held").len());
}

/// The elastic first crack, parts of the longer side.
#[divan::bench(args = [16, 32, 64], max_time = 10)]
fn elastic(bencher: Bencher<'_, '_>, parts: u32) {
    let plate = panel();
    let at = |parts| first_crack(black_box(&plate), 4000.0 / f64::from(parts), PATCH);
    bencher.bench_local(|| at(parts).expect("it is held").pressure);
}
