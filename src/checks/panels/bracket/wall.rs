//! One leaf of a panel as the limit analyses see it.

use crate::building::{Edge, Frame, PanelOpening, Span};
use crate::checks::panels::strength::Strength;
use crate::quantity::Length;
use crate::solve::plate::{Carry, Held, Opening, Plate, Stretch};
use crate::standards::masonry::Edge as Kind;

/// What the bed joints bear: N and mm.
#[derive(Clone, Debug)]
pub struct Joints {
    /// Design flexural strength without precompression.
    f_xd1: f64,
    /// Helping factor over thickness, times the dead load on top.
    sigma_top: f64,
    /// The same of the own weight, per height.
    sigma_own: f64,
    /// Largest helping stress.
    cap: f64,
    /// Section modulus per length.
    Z: f64,
    /// Height of the panel.
    h: f64,
    /// Largest moment counted: an orthogonal ratio above 1 is taken as 1.
    most: f64,
    /// Openings: from where to where, sill.
    columns: Vec<(f64, f64, f64)>,
}

impl Joints {
    /// Moment per length at which the bed joint at (x, y) opens, N: 6.3.1(3) and (4), the stress of the dead load at
    /// its own height instead of mid-height.
    ///
    /// Over and under an opening only the masonry above the joint presses it, under a sill no more than up to the
    /// sill: what the floors bring goes to the piers.
    pub fn moment(&self, x: f64, y: f64) -> f64 {
        let column = self.columns.iter().find(|c| c.0 < x && x < c.1);
        let (load, top) = match column {
            None => (self.sigma_top, self.h),
            Some(&(_, _, sill)) if y <= sill => (0.0, sill),
            Some(_) => (0.0, self.h),
        };
        let sigma = load + self.sigma_own * (top - y).max(0.0);
        ((self.f_xd1 + sigma.min(self.cap)) * self.Z).min(self.most)
    }
}

/// A leaf between its edges.
#[derive(Clone, Debug)]
pub struct Wall {
    /// Length and height, mm.
    pub size: (f64, f64),
    openings: Vec<Opening>,
    edges: [Vec<Stretch>; 4],
    m_H: f64,
    joints: Joints,
}

impl Wall {
    /// A leaf of `span`, its frames as `frame` where nobody knows them; none where it has no strength across the
    /// bed joints.
    pub fn new(span: &Span, h: Length, strength: &Strength, frame: Frame) -> Option<Self> {
        let m_H = strength.across?.0.base();
        let (l, h) = (span.length.base(), h.base());
        let openings: Vec<Opening> = span.openings.iter().map(|o| opening(o, frame)).collect();
        let joints = Joints {
            f_xd1: strength.f_xd1.base(),
            sigma_top: strength.sigma_top.base(),
            sigma_own: strength.sigma_own.base(),
            cap: 0.2 * strength.f_d.base(),
            Z: strength.Z.base(),
            h,
            most: m_H,
            columns: openings.iter().map(|o| (o.x.0, o.x.1, o.y.0)).collect(),
        };
        let upright = |e: &Edge| stretches(e, h, &[], |_| m_H);
        // A joint without strength is held by the weight on it alone: 6.3.1(4) with no flexural strength.
        let dry = Joints { f_xd1: 0.0, ..joints.clone() };
        let level = |e: &Edge, y: f64| {
            let joints = if e.dpc { &dry } else { &joints };
            stretches(e, l, &joints.columns, |x| joints.moment(x, y))
        };
        let edges = [upright(&span.left), upright(&span.right), level(&span.base, 0.0), level(&span.top, h)];
        Some(Self { size: (l, h), openings, edges, m_H, joints })
    }

    /// The same without openings, and all dead load on it.
    pub fn solid(&self) -> Self {
        let mut solid = self.clone();
        solid.openings.clear();
        solid.joints.columns.clear();
        solid
    }

    /// The same with bed joints that have no strength but that of the weight on them.
    pub fn cracked(&self) -> Self {
        let mut cracked = self.clone();
        cracked.joints.f_xd1 = 0.0;
        cracked
    }

    /// Moment per length at which a bed joint of a pier opens, at the top and at the foot of the wall, N.
    pub fn pier(&self) -> (f64, f64) {
        let pier = Joints { columns: Vec::new(), ..self.joints.clone() };
        (pier.moment(0.0, self.size.1), pier.moment(0.0, 0.0))
    }

    /// What the analyses take.
    pub fn with<R>(&self, work: impl FnOnce(&Plate<'_>) -> R) -> R {
        let m_V = |x: f64, y: f64| self.joints.moment(x, y);
        work(&Plate {
            l: self.size.0,
            h: self.size.1,
            openings: self.openings.clone(),
            edges: self.edges.clone(),
            m_H: self.m_H,
            m_V: &m_V,
        })
    }

    /// Every number of it, to know it again by.
    pub fn key(&self) -> Vec<u64> {
        let j = &self.joints;
        let mut all =
            vec![self.size.0, self.size.1, self.m_H, j.f_xd1, j.sigma_top, j.sigma_own, j.cap, j.Z, j.most];
        for o in &self.openings {
            all.extend([o.x.0, o.x.1, o.y.0, o.y.1, f64::from(o.carry as u8)]);
        }
        for edge in &self.edges {
            all.push(edge.len() as f64);
            for s in edge {
                let held = match s.held {
                    Held::Free => -2.0,
                    Held::Simple => -1.0,
                    Held::Continuous(m) => m,
                    // A moment never reaches this.
                    Held::Weight(m) => 1e12 + m,
                };
                all.extend([s.from, s.to, held]);
            }
        }
        all.into_iter().map(f64::to_bits).collect()
    }
}

fn opening(o: &PanelOpening, unknown: Frame) -> Opening {
    let (x, y) = (o.at.base(), o.sill.base());
    let frame = if o.frame == Frame::Unknown { unknown } else { o.frame };
    let carry = match frame {
        Frame::Jambs | Frame::Unknown => Carry::Jambs,
        Frame::AllRound => Carry::AllRound,
        Frame::HeadAndSill => Carry::HeadAndSill,
    };
    Opening { x: (x, x + o.width.base()), y: (y, y + o.height.base()), carry }
}

/// An edge as stretches: free beside the stretch held, and parted at openings, over and under which a bed joint bears
/// less. `bears` is what the wall itself bears at a place on the edge, or at a dpc the weight on it, N.
fn stretches(
    edge: &Edge,
    length: f64,
    columns: &[(f64, f64, f64)],
    bears: impl Fn(f64) -> f64,
) -> Vec<Stretch> {
    let (from, to) = edge.stretch.map_or((0.0, length), |(a, z)| (a.base(), z.base()));
    let mut cuts = vec![0.0, from, to, length];
    cuts.extend(columns.iter().flat_map(|c| [c.0, c.1]));
    cuts.sort_by(f64::total_cmp);
    cuts.dedup();
    let mut out: Vec<Stretch> = Vec::new();
    for pair in cuts.windows(2) {
        let middle = (pair[0] + pair[1]) / 2.0;
        let held = match edge.kind {
            _ if middle < from || middle > to => Held::Free,
            Kind::Free => Held::Free,
            Kind::Simple if edge.dpc => Held::Weight(bears(middle)),
            Kind::Simple => Held::Simple,
            Kind::Continuous => Held::Continuous(bears(middle)),
        };
        match out.last_mut() {
            Some(last) if last.held == held => last.to = pair[1],
            _ => out.push(Stretch { from: pair[0], to: pair[1], held }),
        }
    }
    out
}

#[cfg(test)]
mod tests {
    use super::*;

    fn edge(kind: Kind, stretch: Option<(f64, f64)>) -> Edge {
        let stretch = stretch.map(|(a, z)| (Length::new(a), Length::new(z)));
        Edge { kind, stretch, dpc: false, reason: String::new() }
    }

    #[test]
    fn an_edge_is_free_beside_the_stretch_that_is_held() {
        let all = stretches(&edge(Kind::Simple, Some((0.0, 900.0))), 2400.0, &[], |_| 1.0);
        let expected = [
            Stretch { from: 0.0, to: 900.0, held: Held::Simple },
            Stretch { from: 900.0, to: 2400.0, held: Held::Free },
        ];
        assert_eq!(all, expected);
    }

    #[test]
    fn a_continuous_edge_bears_less_over_an_opening() {
        let bears = |x: f64| if x > 1000.0 && x < 2000.0 { 2.0 } else { 5.0 };
        let all = stretches(&edge(Kind::Continuous, None), 4000.0, &[(1000.0, 2000.0, 900.0)], bears);
        let held: Vec<Held> = all.iter().map(|s| s.held).collect();
        assert_eq!(held, [Held::Continuous(5.0), Held::Continuous(2.0), Held::Continuous(5.0)]);
        assert_eq!((all[1].from, all[1].to), (1000.0, 2000.0));
    }

    #[test]
    fn a_dpc_is_held_by_weight_alone() {
        let base = Edge { dpc: true, ..edge(Kind::Simple, None) };
        let all =
            stretches(&base, 4000.0, &[(1000.0, 2000.0, 900.0)], |x| if x < 1000.0 { 3.0 } else { 1.0 });
        let held: Vec<Held> = all.iter().map(|s| s.held).collect();
        assert_eq!(held, [Held::Weight(3.0), Held::Weight(1.0)]);
    }

    #[test]
    fn under_a_sill_only_the_wall_up_to_it_presses_the_joint() {
        let joints = Joints {
            f_xd1: 0.1,
            sigma_top: 0.05,
            sigma_own: 0.00002,
            cap: 0.08,
            Z: 1750.0,
            h: 2400.0,
            most: 1e9,
            columns: vec![(1000.0, 2000.0, 900.0)],
        };
        // 6.3.1(4) by hand: (0.1 + 0.05 + 0.00002 * 1200) Z, and under the sill (0.1 + 0.00002 * 500) Z.
        let near = |a: f64, b: f64| assert!((a - b).abs() < 1e-9 * b, "{a} {b}");
        near(joints.moment(500.0, 1200.0), (0.1 + 0.05 + 0.024) * 1750.0);
        near(joints.moment(1500.0, 400.0), (0.1 + 0.01) * 1750.0);
        // Over the head the floor's load is left out, 0.00002 * 200.
        near(joints.moment(1500.0, 2200.0), (0.1 + 0.004) * 1750.0);
        // Capped at 0.08 near the foot: 0.05 + 0.046.
        near(joints.moment(500.0, 100.0), 0.18 * 1750.0);
    }
}
