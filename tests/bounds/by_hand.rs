//! Piers and strips by hand beside the limit analyses: how far they lie apart.

use perpend::building::Frame;
use perpend::solve::plate::safe::safe;
use perpend::solve::plate::upper::{upper, usual_spacing};
use perpend::solve::plate::{Carry, Held, Opening, Plate, Stretch};

use crate::examples::hand_openings::{panel, pressure, resistances, window};

/// By hand, from below and from above, for the brick leaf of 4.0 x 2.4 m on four simple edges with one opening.
fn three(at: f64, width: f64, sill: f64, height: f64, frame: Frame) -> [f64; 3] {
    let by_hand = pressure(&panel(&[window(at, width, sill, height, frame)]));
    let (m_1, m_2) = resistances();
    let carry = match frame {
        Frame::Jambs => Carry::Jambs,
        Frame::AllRound => Carry::AllRound,
        Frame::HeadAndSill | Frame::Unknown => Carry::HeadAndSill,
    };
    let edge = |to: f64| vec![Stretch { from: 0.0, to, held: Held::Simple }];
    let m_V = move |_: f64, _: f64| m_1;
    let plate = Plate {
        l: 4000.0,
        h: 2400.0,
        openings: vec![Opening { x: (at, at + width), y: (sill, sill + height), carry }],
        edges: [edge(2400.0), edge(2400.0), edge(4000.0), edge(4000.0)],
        m_H: m_2,
        m_V: &m_V,
    };
    let low = safe(&plate, 200.0).expect("held").pressure;
    let high = upper(&plate, usual_spacing(&plate)).expect("held").pressure;
    [by_hand, low, high]
}

/// Piers that span between top and base alone, wide ones too: what the strips take moments in equilibrium take as well.
#[test]
fn strips_stay_below_the_moment_field() {
    let (m_1, m_2) = resistances();
    let m_V = move |_: f64, _: f64| m_1;
    let edge = |to: f64, held: Held| vec![Stretch { from: 0.0, to, held }];
    for (at, width) in [(2800.0, 800.0), (1500.0, 1200.0), (400.0, 800.0)] {
        let mut m = panel(&[window(at, width, 900.0, 1200.0, Frame::Jambs)]);
        m.after.right.kind = perpend::standards::masonry::Edge::Free;
        let plate = Plate {
            l: 4000.0,
            h: 2400.0,
            openings: vec![Opening { x: (at, at + width), y: (900.0, 2100.0), carry: Carry::Jambs }],
            edges: [
                edge(2400.0, Held::Simple),
                edge(2400.0, Held::Free),
                edge(4000.0, Held::Simple),
                edge(4000.0, Held::Simple),
            ],
            m_H: m_2,
            m_V: &m_V,
        };
        let (hand, low) = (pressure(&m), safe(&plate, 125.0).expect("held").pressure);
        assert!(hand <= low * 1.005, "{at} {width}: {hand} by hand, {low}");
    }
}

/// The hand takes no more than the weakest pattern lets through, and not much less than half of it.
#[test]
fn the_hand_stays_below_the_weakest_pattern() {
    for frame in [Frame::Jambs, Frame::AllRound, Frame::HeadAndSill] {
        for (at, width, sill, height) in [
            (1000.0, 1200.0, 900.0, 1200.0),
            (1400.0, 600.0, 900.0, 900.0),
            (700.0, 1800.0, 800.0, 1200.0),
            (1600.0, 900.0, 0.0, 2100.0),
            (600.0, 2400.0, 900.0, 1200.0),
        ] {
            let [hand, low, high] = three(at, width, sill, height, frame);
            assert!(hand <= high, "{frame:?} {at} {width}: {hand} by hand, {low} to {high}");
            if frame == Frame::Jambs {
                assert!(hand >= 0.4 * low, "{frame:?} {at} {width}: {hand} by hand, {low} to {high}");
            }
        }
    }
}
