//! Pieces that stay in the line of the wall that comes out.

use super::storey::{Floor, Line, Support};
use super::{FoundReturn, REACH, STIFFENS, stands};
use crate::building::heights::{storey_height, strip_height};
use crate::quantity::Length;

/// The pieces at either end of the wall that comes out, each with the wall that it meets.
pub fn of(floor: &Floor<'_>) -> Vec<FoundReturn> {
    let gone = floor.gone();
    let pieces = floor.lines.iter().filter(|l| {
        !l.wall.removed
            && l.along == gone.along
            && (l.at - gone.at).abs() <= REACH
            && ((l.to - gone.from).abs() <= REACH || (l.from - gone.to).abs() <= REACH)
    });
    pieces.filter_map(|piece| one(floor, piece)).collect()
}

fn one(floor: &Floor<'_>, piece: &Line<'_>) -> Option<FoundReturn> {
    let gone = floor.gone();
    let before = (piece.to - gone.from).abs() <= REACH;
    // The far end is where it meets a wall; the near end is free once the wall is out.
    let (far, near) = if before { (piece.from, piece.to) } else { (piece.to, piece.from) };
    let met = floor.meets(piece.along, piece.at, far)?;
    let length = match before {
        true => piece.openings.first().map_or(near, |o| o.0) - far,
        false => far - piece.openings.last().map_or(near, |o| o.1),
    };
    // Its line runs on to that of the wall met; it begins at the face.
    let build_up = floor.build_up(met)?;
    let length = (length - build_up.thickness().base() / 2.0).max(0.0);
    let row = floor.row(met);
    let s = piece.at;
    let half = piece.thickness / 2.0;
    let supports = floor.supports(met);
    let low = supports.iter().rev().find(|x| x.at < s);
    let high = supports.iter().find(|x| x.at > s);
    let (low_edge, high_edge) = free_length(&row.openings, (row.from, row.to), s);
    let edges = [s - half - low_edge, high_edge - s - half];
    let clear = |x: Option<&Support>| x.map(|x| Length::new(((x.at - s).abs() - half - x.half).max(0.0)));
    let spans =
        [low.map_or(s - row.from, |x| (s - x.at) / 2.0), high.map_or(row.to - s, |x| (x.at - s) / 2.0)];
    let opening = row
        .openings
        .iter()
        .map(|o| if o.1 <= s { s - half - o.1 } else { (o.0 - s - half).max(0.0) })
        .min_by(f64::total_cmp);
    Some(FoundReturn {
        mark: piece.wall.mark.clone(),
        meets: met.wall.mark.clone(),
        length: Length::new(length),
        tributary: Length::new(spans[0] + spans[1]),
        nearest_opening: opening.map(Length::new),
        to_end: edges.map(|e| Length::new(e.max(0.0))),
        to_next: [clear(low), clear(high)],
        thickness: build_up.loaded().1.thickness,
        supported: supported(floor, met),
        strip: strip_height(&floor.around.storeys, floor.number),
        holds: length >= STIFFENS * floor.storey().clear_height.base(),
    })
}

/// The stretch around `s` that has no opening.
fn free_length(openings: &[(f64, f64)], (from, to): (f64, f64), s: f64) -> (f64, f64) {
    let low = openings.iter().map(|o| o.1).filter(|&e| e <= s).fold(from, f64::max);
    let high = openings.iter().map(|o| o.0).filter(|&e| e >= s).fold(to, f64::min);
    (low, high)
}

/// Height over all storeys in which the wall met stands.
fn supported(floor: &Floor<'_>, met: &Line<'_>) -> Length {
    let around = floor.around;
    let in_storey = |k: &usize| stands(met.wall, &around.storeys[*k].mark, around.storey);
    (0..around.storeys.len()).filter(in_storey).map(|k| storey_height(&around.storeys, k)).sum()
}
