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
    let mut solver = DefaultSolver::new(&flat, &aim, matrix, right, kinds, settings)
        .map_err(|e| Trouble::NotSolved(e.to_string()))?;
    solver.solve();
    match solver.solution.status {
        SolverStatus::Solved => Ok((solver.solution.x, SolverStatus::Solved.to_string())),
        other => Err(Trouble::NotSolved(other.to_string())),
    }
}
