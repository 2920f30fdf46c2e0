//! Elastic moments against series, finite differences and statics, all worked here. Lengths and pressure of 1.

use std::f64::consts::PI;

use perpend::solve::plate::elastic::{POISSON, field, first_crack};
use perpend::solve::plate::safe::{Field, Moments};
use perpend::solve::plate::{Held, Plate, Stretch};

/// A plate without openings; edges left, right, base, top: S simple, C continuous with `clamp`, F free.
pub fn plain<'a>(
    (l, h): (f64, f64),
    word: &str,
    clamp: f64,
    m_H: f64,
    m_V: &'a (dyn Fn(f64, f64) -> f64 + Sync),
) -> Plate<'a> {
    let held = |c| match c {
        'S' => Held::Simple,
        'C' => Held::Continuous(clamp),
        _ => Held::Free,
    };
    let mut letters = word.chars();
    let edges = [h, h, l, l]
        .map(|to| vec![Stretch { from: 0.0, to, held: held(letters.next().expect("four letters")) }]);
    Plate { l, h, openings: vec![], edges, m_H, m_V }
}

pub fn near(value: f64, wanted: f64, part: f64) {
    assert!((value / wanted - 1.0).abs() < part, "{value} for {wanted}");
}

/// Means of Navier's double series for a simply supported plate over the rectangle `x`, `y`: with `w` a sum of
/// sines, `16 / (pi^6 D m n K^2)` for odd `m` and `n`, `K = m^2 / l^2 + n^2 / h^2`; moments are its curvatures.
fn navier((l, h): (f64, f64), poisson: f64, x: (f64, f64), y: (f64, f64)) -> Moments {
    let sine = |k: f64, (from, to): (f64, f64)| ((k * from).cos() - (k * to).cos()) / (k * (to - from));
    let cosine = |k: f64, (from, to): (f64, f64)| ((k * to).sin() - (k * from).sin()) / (k * (to - from));
    let mut sum = Moments::default();
    for m in (1..100).step_by(2).map(f64::from) {
        for n in (1..100).step_by(2).map(f64::from) {
            let (p, q) = (m / l, n / h);
            let size = 16.0 / (PI.powi(4) * m * n * (p * p + q * q).powi(2));
            let waves = sine(PI * p, x) * sine(PI * q, y);
            sum.x += size * (p * p + poisson * q * q) * waves;
            sum.y += size * (q * q + poisson * p * p) * waves;
            sum.xy -= size * (1.0 - poisson) * p * q * cosine(PI * p, x) * cosine(PI * q, y);
        }
    }
    sum
}

/// The pressure at which Johansen's criterion is first met by the means of Navier's series: by halving, on
/// squares as wide as `patch` all over the plate.
fn navier_crack((l, h): (f64, f64), m_V: f64, patch: f64) -> f64 {
    let ends = |i: u32, to: f64| {
        let at = f64::from(i) / 40.0 * to;
        ((at - patch / 2.0).max(0.0), (at + patch / 2.0).min(to))
    };
    let all = (0..=40).flat_map(|i| (0..=40).map(move |j| (i, j)));
    all.map(|(i, j)| {
        let m = navier((l, h), POISSON, ends(i, l), ends(j, h));
        let stands = |p: f64| {
            [p, -p].iter().all(|p| {
                let (a, b) = (1.0 - p * m.x, m_V - p * m.y);
                a > 0.0 && b > 0.0 && a * b > (p * m.xy).powi(2)
            })
        };
        let (mut low, mut high) = (0.0, 1e4);
        for _ in 0..60 {
            let middle = (low + high) / 2.0;
            if stands(middle) { low = middle } else { high = middle }
        }
        low
    })
    .fold(f64::INFINITY, f64::min)
}

/// The mean over the triangles that lie wholly between `x` and `y`, which cover it.
fn mean(field: &[Field], x: (f64, f64), y: (f64, f64)) -> Moments {
    let mut whole = 0.0;
    let mut sum = Moments::default();
    for Field { corners: p, moments } in field {
        let inside =
            |c: &[f64; 2]| x.0 - 1e-9 < c[0] && c[0] < x.1 + 1e-9 && y.0 - 1e-9 < c[1] && c[1] < y.1 + 1e-9;
        if p.iter().all(inside) {
            let area = (p[1][0] - p[0][0]) * (p[2][1] - p[0][1]) - (p[1][1] - p[0][1]) * (p[2][0] - p[0][0]);
            whole += area;
            sum.x += area * moments[0].x;
            sum.y += area * moments[0].y;
            sum.xy += area * moments[0].xy;
        }
    }
    near(whole, 2.0 * (x.1 - x.0) * (y.1 - y.0), 1e-9);
    Moments { x: sum.x / whole, y: sum.y / whole, xy: sum.xy / whole }
}

#[test]
fn moments_come_near_naviers_series() {
    for (l, h) in [(1.0, 1.0), (2.0, 1.0)] {
        let (x, y) = ((0.375 * l, 0.625 * l), (0.375 * h, 0.625 * h));
        let corner = ((0.0, 0.125 * l), (0.0, 0.125 * h));
        let off = |spacing: f64| {
            let field =
                field(&plain((l, h), "SSSS", 0.0, 1.0, &|_, _| 1.0), spacing, POISSON).expect("it is held");
            let (found, wanted) = (mean(&field, x, y), navier((l, h), POISSON, x, y));
            let (twist, twisted) =
                (mean(&field, corner.0, corner.1), navier((l, h), POISSON, corner.0, corner.1));
            [found.x / wanted.x - 1.0, found.y / wanted.y - 1.0, twist.xy / twisted.xy - 1.0]
        };
        let [coarse, fine, finest] = [8.0, 16.0, 32.0].map(|parts| off(1.0 / parts));
        for (i, limit) in [1e-3, 1e-3, 4e-3].into_iter().enumerate() {
            assert!(finest[i].abs() < limit, "{finest:?}");
            // Half the step, a quarter of the error, or nearly.
            assert!(fine[i].abs() < coarse[i].abs() / 3.0 && finest[i].abs() < fine[i].abs() / 3.0);
        }
    }
}

#[test]
fn simple_plates_crack_where_naviers_series_says() {
    for (l, h, m_V) in [(1.0, 1.0, 1.0), (1.0, 1.0, 0.35), (2.0, 1.0, 1.0), (2.0, 1.0, 0.35), (1.0, 2.0, 0.5)]
    {
        let bed = move |_: f64, _: f64| m_V;
        let wanted = navier_crack((l, h), m_V, 0.125);
        let found = first_crack(&plain((l, h), "SSSS", 0.0, 1.0, &bed), f64::max(l, h) / 32.0, 0.125)
            .expect("it is held");
        near(found.pressure, wanted, 2e-3);
        assert!(found.peak < found.pressure);
    }
}

/// Deflections of a clamped square of `n` x `n` steps by the thirteen-point form of `D lap lap w = p`: nought on the
/// edge, mirrored beyond it; a band of Gauss's elimination. D = p = 1.
fn clamped_square(n: usize) -> Vec<Vec<f64>> {
    let (m, step) = (n - 1, 1.0 / n as f64);
    let band = 2 * m;
    let mut a = vec![vec![0.0; 2 * band + 1]; m * m];
    let mut w = vec![step.powi(4); m * m];
    let stencil: [(isize, isize, f64); 13] = [
        (0, 0, 20.0),
        (1, 0, -8.0),
        (-1, 0, -8.0),
        (0, 1, -8.0),
        (0, -1, -8.0),
        (1, 1, 2.0),
        (1, -1, 2.0),
        (-1, 1, 2.0),
        (-1, -1, 2.0),
        (2, 0, 1.0),
        (-2, 0, 1.0),
        (0, 2, 1.0),
        (0, -2, 1.0),
    ];
    // Inside points count from 0; -1 and m lie on the edge, what lies beyond them is the mirror image.
    let mirrored = |k: isize| match k {
        -1 => None,
        -2 => Some(0),
        k if k == m as isize => None,
        k if k == m as isize + 1 => Some(m - 1),
        k => Some(k as usize),
    };
    for i in 0..m {
        for j in 0..m {
            for (di, dj, factor) in stencil {
                if let (Some(x), Some(y)) = (mirrored(i as isize + di), mirrored(j as isize + dj)) {
                    a[i * m + j][band + x * m + y - (i * m + j)] += factor;
                }
            }
        }
    }
    for row in 0..m * m {
        for below in row + 1..(row + band + 1).min(m * m) {
            let times = a[below][band + row - below] / a[row][band];
            if times != 0.0 {
                for k in 0..=band {
                    a[below][band + row - below + k] -= times * a[row][band + k];
                }
                w[below] -= times * w[row];
            }
        }
    }
    for row in (0..m * m).rev() {
        let known: f64 = (1..=band.min(m * m - 1 - row)).map(|k| a[row][band + k] * w[row + k]).sum();
        w[row] = (w[row] - known) / a[row][band];
    }
    w.chunks(m).map(<[f64]>::to_vec).collect()
}

/// Hogging at the middle of the edge and sagging at the middle, by those deflections, Poisson's ratio 0.3.
fn clamped_moments(n: usize) -> (f64, f64) {
    let (w, c, square) = (clamped_square(n), n / 2 - 1, (n * n) as f64);
    let bent = 2.0 * w[c][c] - w[c - 1][c] - w[c + 1][c];
    (2.0 * w[0][c] * square, 1.3 * bent * square)
}

#[test]
fn a_clamped_square_bends_as_differences_say() {
    let (coarse, fine) = (clamped_moments(16), clamped_moments(32));
    // Their error falls with the square of the step.
    let [edge, middle] = [(coarse.0, fine.0), (coarse.1, fine.1)].map(|(c, f)| f + (f - c) / 3.0);
    // Timoshenko and Woinowsky-Krieger, Theory of Plates and Shells, clamped square, nu = 0.3: 0.0513 and 0.0231,
    // figures from memory.
    near(edge, 0.0513, 2e-3);
    near(middle, 0.0231, 0.01);
    let (bed, s) = (|_: f64, _: f64| 1.0, 1.0 / 32.0);
    let plate = plain((1.0, 1.0), "CCCC", 0.1, 1.0, &bed);
    let field = field(&plate, s, 0.3).expect("it is held");
    let sagging = mean(&field, (0.5 - s, 0.5 + s), (0.5 - s, 0.5 + s));
    let crack = first_crack(&plate, s, 2.0 * s).expect("it is held");
    near(sagging.x, middle, 0.005);
    near(sagging.y, middle, 0.005);
    // The moment at a clamped edge does not hang on Poisson's ratio.
    near(0.1 / crack.pressure, edge, 0.005);
    let (x, y) = crack.at;
    assert!([x, 1.0 - x, y, 1.0 - y].iter().any(|v| v.abs() < 1e-9), "{crack:?}");
    assert!((x - 0.5).abs() < 1e-9 || (y - 0.5).abs() < 1e-9, "{crack:?}");
}

/// The bending moments on the grid line across y at `at`: those of the triangles with a side on it.
fn on_line(field: &[Field], at: f64) -> Vec<f64> {
    let on = |f: &&Field| f.corners.iter().filter(|c| (c[1] - at).abs() < 1e-9).count() == 2;
    field.iter().filter(on).map(|f| f.moments[0].y).collect()
}

/// A strip between base and top is a beam: `p h^2 / 8` at mid-height, a cantilever has `p h^2 / 2` at its foot. Means
/// by statics, whatever Poisson's ratio; without Poisson's effect every place comes near as well. The other edges bring none.
#[test]
fn strips_are_beams() {
    for (word, at, wanted) in [("FFSS", 0.5, 0.125), ("FFCF", 0.0, -0.5)] {
        let mut off = Vec::new();
        for (parts, poisson) in [(4.0, 0.0), (8.0, 0.0), (16.0, 0.0), (9.0, 0.2), (16.0, 0.4)] {
            let plate = plain((1.0, 1.0), word, 9.0, 1.0, &|_, _| 1.0);
            let field = field(&plate, 1.0 / parts, poisson).expect("it is held");
            let line = on_line(&field, at);
            near(line.iter().sum::<f64>() / line.len() as f64, wanted, 1e-9);
            if poisson == 0.0 {
                off.push(line.iter().map(|m| (m / wanted - 1.0).abs()).fold(0.0, f64::max));
                let head = on_line(&field, 1.0).iter().map(|m| m.abs()).fold(0.0, f64::max);
                assert!(head < 1e-12, "{word}: {head}");
            }
        }
        assert!(off[0] > off[1] && off[1] > off[2] && off[2] < 1e-3, "{word}: {off:?}");
    }
}

/// Statics alone: the mean moment along the foot of a cantilever, a patch wider than the panel.
#[test]
fn the_foot_of_a_cantilever_brings_half_w_h_squared() {
    for (l, h, clamp) in [(3.0, 1.0, 0.3), (1.0, 2.0, 0.05)] {
        let crack =
            first_crack(&plain((l, h), "FFCF", clamp, 9.0, &|_, _| 9.0), 0.1, 10.0).expect("it is held");
        near(crack.pressure, 2.0 * clamp / (h * h), 1e-7);
        assert!(crack.bed_joint && crack.at.1 == 0.0, "{crack:?}");
    }
}
