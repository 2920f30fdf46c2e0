//! The moments of least complementary energy, by a quadratic programme without cones.

use clarabel::algebra::CscMatrix;

use crate::solve::plate::Trouble;
use crate::solve::plate::safe::mesh::{Mesh, Rim};
use crate::solve::plate::safe::rows::{Rows, stacked};
use crate::solve::plate::safe::solver::least;
use crate::solve::plate::safe::statics::{Moments, fields, forces, shape};

/// The normal moment of every side under `loads`, one a node; sides with a `clamp` of 0 on the rim carry none.
///
/// # Errors
/// [`Trouble::NotSolved`] where the solver ends with anything but a solution.
pub fn normal_moments(mesh: &Mesh, clamp: &[f64], loads: &[f64], poisson: f64) -> Result<Vec<f64>, Trouble> {
    let (number, count) = unknowns(mesh, clamp);
    // The solver's tolerances are made for loads about 1.
    let unit = loads.iter().copied().fold(f64::MIN_POSITIVE, f64::max);
    let mut rows = Rows::default();
    for (node, forces) in forces(mesh).iter().enumerate().filter(|(n, _)| !mesh.held[*n]) {
        let terms: Vec<_> = forces.iter().filter_map(|&(side, f)| Some((number[side]?, f))).collect();
        rows.push(&terms, loads[node] / unit);
    }
    let (matrix, right) = stacked([rows, Rows::default(), Rows::default()], count);
    let (moments, _) = least(&compliance(mesh, &number, count, poisson), &matrix, &right)?;
    Ok(number.iter().map(|n| n.map_or(0.0, |n| moments[n] * unit)).collect())
}

/// The sides that carry a moment, numbered, and how many they are.
fn unknowns(mesh: &Mesh, clamp: &[f64]) -> (Vec<Option<usize>>, usize) {
    let mut count = 0;
    let mut next = || {
        count += 1;
        count - 1
    };
    let carries = mesh.sides.iter().zip(clamp).map(|(s, &clamp)| s.rim == Rim::Inside || clamp > 0.0);
    let number = carries.map(|c| c.then(&mut next)).collect();
    (number, count)
}

/// The energy as a matrix, its upper half, for a bending stiffness of 1 and without the factor
/// `1 / (1 - poisson^2)`: over each triangle `m_x^2 + m_y^2 - 2 nu m_x m_y + 2 (1 + nu) m_xy^2`.
fn compliance(mesh: &Mesh, number: &[Option<usize>], count: usize, poisson: f64) -> CscMatrix<f64> {
    let work = |p: &Moments, q: &Moments| {
        p.x * q.x + p.y * q.y - poisson * (p.x * q.y + p.y * q.x) + 2.0 * (1.0 + poisson) * p.xy * q.xy
    };
    let whole: f64 = mesh.triangles.iter().map(|t| shape(mesh, t).1).sum();
    let each = whole / mesh.triangles.len() as f64;
    let (mut rows, mut columns, mut values) = (Vec::new(), Vec::new(), Vec::new());
    for triangle in &mesh.triangles {
        let part = shape(mesh, triangle).1 / each;
        let fields = fields(mesh, triangle);
        for (p, a) in fields.iter().zip(triangle.sides) {
            for (q, b) in fields.iter().zip(triangle.sides) {
                if let (Some(row), Some(column)) = (number[a], number[b])
                    && row <= column
                {
                    rows.push(row);
                    columns.push(column);
                    values.push(part * work(p, q));
                }
            }
        }
    }
    CscMatrix::new_from_triplets(count, count, rows, columns, values)
}
