//! The linear programme, put as its dual: the largest pressure that no line lets through.
//!
//! Unknown are two or three numbers a node and the pressure. Each line limits them to what it can take, and the
//! multipliers of these limits are the rotations that were asked for. The dual has some hundred unknowns where the
//! mechanism itself has tens of thousands, and the solver is much quicker on it.

use super::lines::{Kind, Line};
use super::modes::{Mode, Scale, modes, number, strength};
use super::nodes::Grid;
use super::work::Loads;
use crate::solve::plate::{Plate, Trouble};
use clarabel::algebra::CscMatrix;
use clarabel::solver::{DefaultSettings, DefaultSolver, IPSolver, NonnegativeConeT, SolverStatus, ZeroConeT};

/// The mechanism that was found.
pub struct Mechanism {
    /// Energy over work, N/mm2; with a price on lines it contains the price.
    pub pressure: f64,
    /// Rotation of each line, sagging positive; free edges 0.
    pub rotations: Vec<f64>,
    /// Step in deflection across each line: mm at its first node, then the slopes along x and y.
    pub steps: Vec<[f64; 3]>,
}

impl Mechanism {
    /// The largest rotation of a line that is no free edge; 1 where nothing turns.
    pub fn largest(&self, lines: &[Line]) -> f64 {
        let held = lines.iter().zip(&self.rotations).filter(|(line, _)| line.kind != Kind::Free);
        let largest = held.map(|(_, turn)| turn.abs()).fold(0.0, f64::max);
        if largest > 0.0 { largest } else { 1.0 }
    }
}

/// The least pressure over all mechanisms; `joint` is a price for each crack as a length added to it, mm.
pub fn solve(plate: &Plate<'_>, grid: &Grid, lines: &[Line], joint: f64) -> Result<Mechanism, Trouble> {
    if lines.is_empty() {
        return Err(Trouble::NotSolved("no lines".into()));
    }
    let scale = Scale { size: plate.l.max(plate.h), moment: strength(grid, lines) };
    let (nodes, conditions) = number(grid, lines);
    let loads = Loads::new(plate);
    let each = lines.iter().enumerate();
    let modes = each.flat_map(|line| modes(grid, &nodes, &loads, &scale, line, joint)).collect::<Vec<_>>();
    let amounts = optimum(&modes, conditions)?;
    Ok(mechanism(lines, &modes, &amounts, &scale))
}

/// How much of each mode the optimum takes, for a total work of 1.
fn optimum(modes: &[Mode], conditions: usize) -> Result<Vec<f64>, Trouble> {
    // Modes without cost are equations in the dual; the others have a limit each way.
    let (free, costly): (Vec<usize>, Vec<usize>) = (0..modes.len()).partition(|&i| modes[i].cost <= 0.0);
    let equations = free.iter().map(|&i| (i, 1.0));
    let rows = equations.chain(costly.iter().flat_map(|&i| [(i, 1.0), (i, -1.0)])).collect::<Vec<_>>();
    let (mut row, mut column, mut value) = (Vec::new(), Vec::new(), Vec::new());
    for (k, &(i, sign)) in rows.iter().enumerate() {
        let work = [(conditions, modes[i].work)];
        for &(unknown, amount) in modes[i].closing.iter().chain(&work) {
            row.push(k);
            column.push(unknown);
            value.push(sign * amount);
        }
    }
    let unknowns = conditions + 1;
    let limits = CscMatrix::new_from_triplets(rows.len(), unknowns, row, column, value);
    let right = rows.iter().map(|&(i, _)| modes[i].cost.max(0.0)).collect::<Vec<_>>();
    let mut aim = vec![0.0; unknowns];
    aim[conditions] = -1.0;
    let cones = [ZeroConeT(free.len()), NonnegativeConeT(2 * costly.len())];
    let flat = CscMatrix::zeros((unknowns, unknowns));
    let wrong = |e: &dyn std::fmt::Display| Trouble::NotSolved(e.to_string());
    let mut solver =
        DefaultSolver::new(&flat, &aim, &limits, &right, &cones, settings()).map_err(|e| wrong(&e))?;
    solver.solve();
    if solver.solution.status != SolverStatus::Solved {
        return Err(wrong(&solver.solution.status));
    }
    let mut amounts = vec![0.0; modes.len()];
    for (&(i, sign), multiplier) in rows.iter().zip(&solver.solution.z) {
        amounts[i] += sign * multiplier;
    }
    Ok(amounts)
}

/// One thread and no printing; tolerances that leave the pressure good to about six figures.
fn settings() -> DefaultSettings<f64> {
    DefaultSettings {
        verbose: false,
        max_threads: 1,
        tol_gap_rel: 1e-6,
        tol_feas: 1e-7,
        ..DefaultSettings::default()
    }
}

/// Puts the amounts back on the lines, in mm and N.
fn mechanism(lines: &[Line], modes: &[Mode], amounts: &[f64], scale: &Scale) -> Mechanism {
    let each = || modes.iter().zip(amounts);
    let energy = each().map(|(mode, amount)| mode.cost * amount.abs()).sum::<f64>();
    let work = each().map(|(mode, amount)| mode.work * amount).sum::<f64>();
    let mut found = Mechanism {
        pressure: energy / work * scale.pressure(),
        rotations: vec![0.0; lines.len()],
        steps: vec![[0.0; 3]; lines.len()],
    };
    for (mode, amount) in each() {
        let by = [scale.size * amount, *amount, *amount];
        let step = &mut found.steps[mode.line];
        for (total, (part, factor)) in step.iter_mut().zip(mode.step.iter().zip(by)) {
            *total += part * factor;
        }
        if lines[mode.line].kind != Kind::Free {
            found.rotations[mode.line] = *amount;
        }
    }
    found
}
