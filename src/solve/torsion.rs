//! How a rigid floor shares a horizontal force among its bracing walls.
//!
//! Rigid-diaphragm statics, derivation our own: walls resist along their length only, the floor
//! moves and turns as one. Rigidities are relative, in any one unit; lengths in any one unit.
//! Checked against N. Taly, Design of Reinforced Masonry Structures, 2nd ed., Examples 7.7 and
//! 7.13 (author and edition from memory).

/// Rigidity of a cantilever pier over E t: bending and shear, `1/(4 r^3 + 3 r)`, r = h/l.
///
/// For a shear modulus of 0.4 E (EN 1996-1-1 3.7.3) and a rectangular section.
pub fn cantilever_rigidity(height_over_length: f64) -> f64 {
    let r = height_over_length;
    1.0 / (4.0 * r.powi(3) + 3.0 * r)
}

/// Rigidity of a pier held against turning at head and foot, over E t: `1/(r^3 + 3 r)`, r = h/l.
///
/// For a shear modulus of 0.4 E (EN 1996-1-1 3.7.3) and a rectangular section.
pub fn fixed_rigidity(height_over_length: f64) -> f64 {
    let r = height_over_length;
    1.0 / (r.powi(3) + 3.0 * r)
}

/// Rigidity of parts one above the other: their flexibilities add up.
pub fn in_series(rigidities: &[f64]) -> f64 {
    1.0 / rigidities.iter().map(|r| 1.0 / r).sum::<f64>()
}

/// Rigidity of parts side by side.
pub fn in_parallel(rigidities: &[f64]) -> f64 {
    rigidities.iter().sum()
}

/// Direction in which a wall resists: that of its length.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Along {
    /// Parallel to x.
    X,
    /// Parallel to y.
    Y,
}

/// One bracing wall in plan.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Bracing {
    /// Direction of its length.
    pub along: Along,
    /// Place of its centre.
    pub x: f64,
    /// Place of its centre.
    pub y: f64,
    /// Rigidity along its length.
    pub rigidity: f64,
}

/// A horizontal force on the floor.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Push {
    /// Component in x.
    pub f_x: f64,
    /// Component in y.
    pub f_y: f64,
    /// Point it acts at.
    pub x: f64,
    /// Point it acts at.
    pub y: f64,
}

/// What one wall takes along its length: positive with the axis.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Share {
    /// By its share of rigidity.
    pub direct: f64,
    /// By the turning of the floor.
    pub torsion: f64,
}

impl Share {
    /// Both together.
    pub const fn total(self) -> f64 {
        self.direct + self.torsion
    }

    /// The part to design for where relief by torsion is not counted on.
    pub fn without_relief(self) -> f64 {
        if self.direct * self.torsion < 0.0 { self.direct } else { self.total() }
    }
}

/// The floor's stiffness in plan and what each wall takes.
#[derive(Clone, Debug, PartialEq)]
pub struct Shares {
    /// Centre of rigidity.
    pub x_r: f64,
    /// Centre of rigidity.
    pub y_r: f64,
    /// Torsional rigidity about it: sum of rigidity times distance squared.
    pub j: f64,
    /// Torsion about it, anticlockwise positive.
    pub torsion: f64,
    /// One for each wall, in their order.
    pub walls: Vec<Share>,
}

/// Why a force cannot be shared.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Unbraced {
    /// A rigidity or length is not a finite number, or a rigidity is negative.
    Invalid,
    /// Nothing resists along x.
    AlongX,
    /// Nothing resists along y.
    AlongY,
    /// The force turns the floor and nothing resists turning.
    Turning,
}

/// Shares a push among walls by rigidity, with torsion.
///
/// # Errors
/// [`Unbraced`], where a component of the force finds nothing to resist it. A direction without
/// walls is accepted where no force acts along it; its centre then is the push's own line.
pub fn share(walls: &[Bracing], push: Push) -> Result<Shares, Unbraced> {
    let finite = |w: &Bracing| [w.x, w.y, w.rigidity].iter().all(|v| v.is_finite()) && w.rigidity >= 0.0;
    if !walls.iter().all(finite) || ![push.f_x, push.f_y, push.x, push.y].iter().all(|v| v.is_finite()) {
        return Err(Unbraced::Invalid);
    }
    let sum = |along: Along, of: fn(&Bracing) -> f64| {
        walls.iter().filter(|w| w.along == along).map(|w| w.rigidity * of(w)).sum::<f64>()
    };
    let (k_x, k_y) = (sum(Along::X, |_| 1.0), sum(Along::Y, |_| 1.0));
    if push.f_x != 0.0 && k_x == 0.0 {
        return Err(Unbraced::AlongX);
    }
    if push.f_y != 0.0 && k_y == 0.0 {
        return Err(Unbraced::AlongY);
    }
    let x_r = if k_y > 0.0 { sum(Along::Y, |w| w.x) / k_y } else { push.x };
    let y_r = if k_x > 0.0 { sum(Along::X, |w| w.y) / k_x } else { push.y };

    let arm = |w: &Bracing| match w.along {
        Along::X => -(w.y - y_r),
        Along::Y => w.x - x_r,
    };
    let j: f64 = walls.iter().map(|w| w.rigidity * arm(w).powi(2)).sum();
    let torsion = push.f_y * (push.x - x_r) - push.f_x * (push.y - y_r);
    let size = push.f_x.hypot(push.f_y) * (push.x - x_r).hypot(push.y - y_r);
    let turns = torsion.abs() > 1e-12 * size;
    if turns && j <= 0.0 {
        return Err(Unbraced::Turning);
    }
    let shares = walls
        .iter()
        .map(|w| Share {
            direct: match w.along {
                Along::X if k_x > 0.0 => push.f_x * w.rigidity / k_x,
                Along::Y if k_y > 0.0 => push.f_y * w.rigidity / k_y,
                _ => 0.0,
            },
            torsion: if turns { torsion * w.rigidity * arm(w) / j } else { 0.0 },
        })
        .collect();
    Ok(Shares { x_r, y_r, j, torsion, walls: shares })
}

#[cfg(test)]
mod tests {
    use super::*;

    fn wall(along: Along, x: f64, y: f64, rigidity: f64) -> Bracing {
        Bracing { along, x, y, rigidity }
    }

    /// Equilibrium: forces and moment of the shares equal the push, whatever the plan.
    #[test]
    fn shares_are_in_equilibrium_with_the_push() {
        let walls = [
            wall(Along::Y, 0.0, 2.0, 3.0),
            wall(Along::Y, 4.0, 1.0, 1.0),
            wall(Along::Y, 9.0, 5.0, 0.4),
            wall(Along::X, 3.0, 0.0, 2.0),
            wall(Along::X, 5.0, 8.0, 0.7),
        ];
        let push = Push { f_x: 3.0, f_y: -7.0, x: 4.5, y: 4.0 };
        let got = share(&walls, push).unwrap();
        let (mut f_x, mut f_y, mut m) = (0.0, 0.0, 0.0);
        for (w, s) in walls.iter().zip(&got.walls) {
            match w.along {
                Along::X => {
                    f_x += s.total();
                    m -= s.total() * w.y;
                }
                Along::Y => {
                    f_y += s.total();
                    m += s.total() * w.x;
                }
            }
        }
        assert!((f_x - push.f_x).abs() < 1e-12 && (f_y - push.f_y).abs() < 1e-12);
        assert!((m - (push.f_y * push.x - push.f_x * push.y)).abs() < 1e-12);
    }

    #[test]
    fn what_nothing_resists_is_refused() {
        let one = [wall(Along::Y, 0.0, 0.0, 1.0)];
        let along = |f_x, f_y, x| share(&one, Push { f_x, f_y, x, y: 0.0 });
        assert_eq!(along(1.0, 0.0, 0.0), Err(Unbraced::AlongX));
        assert_eq!(along(0.0, 1.0, 2.0), Err(Unbraced::Turning));
        assert_eq!(along(0.0, 1.0, 0.0).unwrap().walls[0].total(), 1.0);
        assert_eq!(along(0.0, f64::NAN, 0.0), Err(Unbraced::Invalid));
        assert_eq!(share(&[], Push { f_x: 0.0, f_y: 1.0, x: 0.0, y: 0.0 }), Err(Unbraced::AlongY));
    }

    #[test]
    fn relief_by_torsion_is_not_counted() {
        assert_eq!(Share { direct: 5.0, torsion: -2.0 }.without_relief(), 5.0);
        assert_eq!(Share { direct: 5.0, torsion: 2.0 }.without_relief(), 7.0);
    }
}
