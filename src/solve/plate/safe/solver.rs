//! The solver, one thread, and its settings.

use clarabel::algebra::CscMatrix;
use clarabel::solver::{DefaultSettings, DefaultSolver, IPSolver, SolverStatus, SupportedConeT};

use crate::solve::plate::Trouble;

/// Hands the programme over: the last unknown as great as the rows allow.
pub fn solved(
    matrix: &CscMatrix<f64>,
    right: &[f64],
    kinds: &[SupportedConeT<f64>],
) -> Result<(Vec<f64>, String), Trouble> {
    let settings = DefaultSettings {
        verbose: false,
        max_threads: 1,
        // Its own solver on one thread: the same numbers on every run.
        direct_solve_method: "qdldl".to_owned(),
        tol_gap_rel: 1e-6,
        tol_feas: 1e-7,
        // It looks for rows with an endless right side, and there are none.
        presolve_enable: false,
        // Weak bed joints make the last steps ill-conditioned: with the preset values they stall.
        static_regularization_constant: 1e-7,
        iterative_refinement_max_iter: 50,
        iterative_refinement_stop_ratio: 1.2,
        ..DefaultSettings::default()
    };
    let mut aim = vec![0.0; matrix.n];
    if let Some(factor) = aim.last_mut() {
        *factor = -1.0;
    }
    let flat = CscMatrix::zeros((matrix.n, matrix.n));
    run((&flat, &aim), (matrix, right, kinds), settings)
}

/// Hands a quadratic programme over: half of `x P x` as small as the rows, all of them equalities, allow.
pub fn least(
    half: &CscMatrix<f64>,
    matrix: &CscMatrix<f64>,
    right: &[f64],
) -> Result<(Vec<f64>, String), Trouble> {
    let settings = DefaultSettings {
        verbose: false,
        max_threads: 1,
        direct_solve_method: "qdldl".to_owned(),
        // There is no cone to approach: one linear system, refined as far as numbers go.
        tol_feas: 1e-10,
        tol_gap_rel: 1e-10,
        tol_gap_abs: 1e-10,
        presolve_enable: false,
        iterative_refinement_max_iter: 50,
        ..DefaultSettings::default()
    };
    let kinds = [SupportedConeT::ZeroConeT(right.len())];
    run((half, &vec![0.0; matrix.n]), (matrix, right, &kinds), settings)
}

type Rows<'a> = (&'a CscMatrix<f64>, &'a [f64], &'a [SupportedConeT<f64>]);

fn run(
    (quadratic, linear): (&CscMatrix<f64>, &[f64]),
    (matrix, right, kinds): Rows<'_>,
    settings: DefaultSettings<f64>,
) -> Result<(Vec<f64>, String), Trouble> {
    let mut solver = DefaultSolver::new(quadratic, linear, matrix, right, kinds, settings)
        .map_err(|e| Trouble::NotSolved(e.to_string()))?;
    solver.solve();
    match solver.solution.status {
        SolverStatus::Solved => Ok((solver.solution.x, SolverStatus::Solved.to_string())),
        other => Err(Trouble::NotSolved(other.to_string())),
    }
}
