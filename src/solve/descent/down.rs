//! Storey by storey: beams to walls, walls to what is under them.

use super::load::{Line, Loads, Point, Triple, add, times};
use super::spread::{self, Under, place_of};
use super::{Descent, From, Model, OnBeam, OnWall, Pier, Place, Support, Trouble};

/// Leads everything down to the ground.
///
/// # Errors
/// [`Trouble`] where a load finds nothing under it.
pub fn lead_down(model: &Model) -> Result<Descent, Trouble> {
    let under = Under::new(model);
    let mut d = Descent {
        walls: vec![OnWall::default(); model.walls.len()],
        beams: vec![OnBeam::default(); model.beams.len()],
        ..Descent::default()
    };
    let mut by_storey = vec![(Vec::new(), Vec::new(), Vec::new()); model.storeys];
    for (i, f) in model.floors.iter().enumerate() {
        by_storey[f.storey].0.push(i);
    }
    for (i, b) in model.beams.iter().enumerate() {
        by_storey[b.storey].1.push(i);
    }
    for (i, w) in model.walls.iter().enumerate() {
        by_storey[w.storey].2.push(i);
    }
    for storey in (0..model.storeys).rev() {
        let (floors, beams, _) = &by_storey[storey];
        for &n in floors {
            let floor = &model.floors[n];
            let area = (floor.x.1 - floor.x.0) * (floor.y.1 - floor.y.0);
            d.applied = add(d.applied, times(floor.load, area));
            for (support, line) in spread::floor(model, &under, n)? {
                on(&mut d, support).lines.push(line);
            }
        }
        if let Some((_, _, above)) = by_storey.get(storey + 1) {
            for &w in above {
                stand(model, &under, &mut d, w)?;
            }
        }
        beams_down(model, &under, &mut d, beams)?;
        for &w in &by_storey[storey].2 {
            through(model, &mut d, w)?;
        }
    }
    for &w in by_storey.first().map_or(&Vec::new(), |s| &s.2) {
        d.ground = add(d.ground, d.walls[w].foot.total());
    }
    Ok(d)
}

fn on(d: &mut Descent, support: Support) -> &mut Loads {
    match support {
        Support::Wall(i) => &mut d.walls[i].head,
        Support::Beam(i) => &mut d.beams[i].loads,
    }
}

/// Puts the foot of wall `w` on what stands under it: beams first, for they bear on the walls.
fn stand(model: &Model, under: &Under, d: &mut Descent, w: usize) -> Result<(), Trouble> {
    let wall = &model.walls[w];
    let Place { along, at, from, to } = wall.place;
    let foot = std::mem::take(&mut d.walls[w].foot);
    let near = under.between(wall.storey - 1, along, at - model.reach, at + model.reach);
    let mut parts: Vec<(f64, f64, Support)> = Vec::new();
    for beams in [true, false] {
        for &(_, support) in near.iter().filter(|(_, s)| matches!(s, Support::Beam(_)) == beams) {
            let place = place_of(model, support);
            for (a, b) in free(&parts, place.from.max(from), place.to.min(to)) {
                parts.push((a, b, support));
            }
        }
    }
    parts.sort_by(|a, b| a.0.total_cmp(&b.0));
    let mut reached = from;
    for &(a, b, _) in &parts {
        if a > reached + model.reach {
            return Err(Trouble::WallFloats { wall: w, from: reached, to: a });
        }
        reached = b;
    }
    if reached + model.reach < to {
        return Err(Trouble::WallFloats { wall: w, from: reached, to });
    }
    for (i, &(a, b, support)) in parts.iter().enumerate() {
        // Each part takes its own stretch, and half of a gap too small to matter, on its end.
        let begin = if i == 0 { from } else { a.midpoint(parts[i - 1].1) };
        let end = parts.get(i + 1).map_or(to, |next| b.midpoint(next.0));
        let loads = on(d, support);
        for line in foot.lines_within(begin, end) {
            let by = From::Wall(w);
            let inside = Line { from: line.from.clamp(a, b), to: line.to.clamp(a, b), by, low: None, ..line };
            if inside.to > inside.from {
                loads.lines.push(inside);
            }
            for (length, at) in
                [((a.min(line.to) - line.from).max(0.0), a), ((line.to - b.max(line.from)).max(0.0), b)]
            {
                if length > 0.0 {
                    loads.points.push(Point { at, load: times(line.load, length), by, low: None });
                }
            }
        }
        let last = i + 1 == parts.len();
        for p in foot.points.iter().filter(|p| begin <= p.at && (p.at < end || last)) {
            let by = From::Wall(w);
            loads.points.push(Point { at: p.at.clamp(a, b), load: p.load, by, low: None });
        }
    }
    d.walls[w].foot = foot;
    Ok(())
}

/// The stretches between two places that no part covers yet.
fn free(parts: &[(f64, f64, Support)], from: f64, to: f64) -> Vec<(f64, f64)> {
    let mut out = vec![(from, to)];
    for &(a, b, _) in parts {
        out = out
            .into_iter()
            .flat_map(|(p, q)| [(p, q.min(a)), (p.max(b), q)])
            .filter(|(p, q)| q > p)
            .collect();
    }
    out.retain(|(p, q)| q > p);
    out
}

/// Beams of a storey: those that carry others after them.
fn beams_down(model: &Model, under: &Under, d: &mut Descent, beams: &[usize]) -> Result<(), Trouble> {
    for &n in beams {
        for end in 0..2 {
            d.beams[n].under[end] = Some(beneath(model, under, n, end)?);
        }
    }
    let mut left: Vec<usize> = beams.to_vec();
    while !left.is_empty() {
        let carries = |n: usize, d: &Descent| {
            left.iter().any(|&m| m != n && d.beams[m].under.contains(&Some(Support::Beam(n))))
        };
        let Some(i) = left.iter().position(|&n| !carries(n, d)) else {
            return Err(Trouble::Ring { beam: left[0] });
        };
        beam_down(model, d, left.remove(i));
    }
    Ok(())
}

/// Places of the two bearings' middles, along the beam.
fn bearings(model: &Model, n: usize) -> [f64; 2] {
    let beam = &model.beams[n];
    [beam.place.from + beam.bearing / 2.0, beam.place.to - beam.bearing / 2.0]
}

fn beam_down(model: &Model, d: &mut Descent, n: usize) {
    let beam = &model.beams[n];
    let (from, to) = (beam.place.from, beam.place.to);
    let own: Triple = [beam.weight, 0.0, 0.0];
    d.applied = add(d.applied, times(own, to - from));
    d.beams[n].loads.lines.push(Line { from, to, load: own, by: From::Own, low: None });
    let [first, second] = bearings(model, n);
    let (total, moment) = (d.beams[n].loads.total(), d.beams[n].loads.moment(first));
    let at_second = times(moment, 1.0 / (second - first));
    d.beams[n].reactions = [add(total, times(at_second, -1.0)), at_second];
    for (end, at) in [first, second].into_iter().enumerate() {
        let Some(support) = d.beams[n].under[end] else { continue };
        // Along the support: the beam's own place along it, or across.
        let place = place_of(model, support);
        let along = if place.along == beam.place.along { at } else { beam.place.at };
        let at = along.clamp(place.from, place.to);
        let load = d.beams[n].reactions[end];
        // A beam across comes from the side on which it lies.
        let across = place.along != beam.place.along;
        let low = across.then(|| if f64::midpoint(from, to) < place.at { 1.0 } else { 0.0 });
        on(d, support).points.push(Point { at, load, by: From::Beam(n, end), low });
    }
}

/// What is under an end of a beam: a wall in its line, a wall across, or another beam.
fn beneath(model: &Model, under: &Under, n: usize, end: usize) -> Result<Support, Trouble> {
    let beam = &model.beams[n];
    let (along, at, s) = (beam.place.along, beam.place.at, bearings(model, n)[end]);
    let covers = |support: Support, s: f64| {
        let place = place_of(model, support);
        place.from - model.reach <= s && s <= place.to + model.reach
    };
    let in_line = under.between(beam.storey, along, at - model.reach, at + model.reach);
    let across = |support: &Support| match *support {
        Support::Wall(i) => model.walls[i].thickness / 2.0 + beam.bearing,
        Support::Beam(_) => model.reach,
    };
    let farthest =
        model.walls.iter().map(|w| w.thickness).fold(0.0, f64::max) / 2.0 + beam.bearing + model.reach;
    let crossing = under.between(beam.storey, along.across(), s - farthest, s + farthest);
    let wall = |s: &Support| matches!(s, Support::Wall(_));
    let fits_line = in_line.iter().map(|x| x.1).filter(wall).find(|&x| {
        let place = place_of(model, x);
        place.from <= s && s <= place.to
    });
    let fits_across = |walls: bool| {
        let near = crossing.iter().filter(|x| wall(&x.1) == walls && x.1 != Support::Beam(n));
        near.filter(|x| (x.0 - s).abs() <= across(&x.1) && covers(x.1, at))
            .min_by(|a, b| (a.0 - s).abs().total_cmp(&(b.0 - s).abs()))
            .map(|x| x.1)
    };
    fits_line
        .or_else(|| fits_across(true))
        .or_else(|| fits_across(false))
        .ok_or(Trouble::BeamFloats { beam: n, end })
}

/// From the head of wall `w` to its foot: own weight, and what is over openings to their sides.
fn through(model: &Model, d: &mut Descent, w: usize) -> Result<(), Trouble> {
    let wall = &model.walls[w];
    let Place { from, to, .. } = wall.place;
    let head = d.walls[w].head.clone();
    let mut foot = Loads::default();
    let mut piers = Vec::new();
    let mut begin = from;
    let ends = wall.openings.iter().map(|o| (o.from, o.to)).chain([(to, to)]);
    for (n, (a, b)) in ends.enumerate() {
        if a <= begin {
            return Err(Trouble::NoJamb { wall: w, opening: n.min(wall.openings.len().saturating_sub(1)) });
        }
        piers.push(Pier { from: begin, to: a, ..Pier::default() });
        begin = b;
    }
    let own = |weight: f64, from: f64, to: f64| {
        let load = [weight, 0.0, 0.0];
        Line { from, to, load, by: From::Own, low: None }
    };
    for pier in &mut piers {
        let mut here = Loads { lines: head.lines_within(pier.from, pier.to).collect(), points: Vec::new() };
        here.points.extend(head.points.iter().filter(|p| pier.from <= p.at && p.at <= pier.to));
        let middle = (pier.from + pier.to) / 2.0;
        (pier.head, pier.moment) = (here.total(), here.moment(middle));
        pier.foot_moment = pier.moment;
        for line in &here.lines {
            from_sides(pier, times(line.load, line.to - line.from), line.low);
        }
        for point in &here.points {
            from_sides(pier, point.load, point.low);
        }
        foot.lines.extend(here.lines);
        foot.points.extend(here.points);
        let weight = own(wall.weight, pier.from, pier.to);
        pier.foot = add(pier.head, times(weight.load, pier.to - pier.from));
        foot.lines.push(weight);
        d.applied = add(d.applied, times(weight.load, pier.to - pier.from));
    }
    for (n, o) in wall.openings.iter().enumerate() {
        let lever = |s: f64| (s - o.from) / (o.to - o.from);
        let mut sides: Vec<[Point; 2]> = Vec::new();
        let mut share = |load: Triple, s: f64, by: From, low: Option<f64>| {
            let k = lever(s);
            sides.push([
                Point { at: o.from, load: times(load, 1.0 - k), by, low },
                Point { at: o.to, load: times(load, k), by, low },
            ]);
        };
        for line in head.lines_within(o.from, o.to) {
            share(times(line.load, line.to - line.from), (line.from + line.to) / 2.0, line.by, line.low);
        }
        for p in head.points.iter().filter(|p| o.from < p.at && p.at < o.to) {
            share(p.load, p.at, p.by, p.low);
        }
        for [left, right] in sides {
            at_jamb(&mut piers[n], left, true);
            at_jamb(&mut piers[n + 1], right, true);
            foot.points.extend([left, right]);
        }
        // The wall over the opening weighs on its sides at the foot, not at the head.
        let over: Triple = [o.over * (o.to - o.from), 0.0, 0.0];
        for (pier, at) in [(n, o.from), (n + 1, o.to)] {
            let point = Point { at, load: times(over, 0.5), by: From::Own, low: None };
            at_jamb(&mut piers[pier], point, false);
            foot.points.push(point);
        }
        if o.under > 0.0 {
            foot.lines.push(own(o.under, o.from, o.to));
        }
        d.applied = add(d.applied, [(o.over + o.under) * (o.to - o.from), 0.0, 0.0]);
    }
    d.walls[w].foot = foot;
    d.walls[w].piers = piers;
    Ok(())
}

/// Adds what an opening brings to the pier beside it.
fn at_jamb(pier: &mut Pier, point: Point, at_head: bool) {
    let moment = times(point.load, point.at - (pier.from + pier.to) / 2.0);
    if at_head {
        pier.head = add(pier.head, point.load);
        pier.moment = add(pier.moment, moment);
        from_sides(pier, point.load, point.low);
    }
    pier.foot = add(pier.foot, point.load);
    pier.foot_moment = add(pier.foot_moment, moment);
}

/// Notes from which sides across a load comes.
fn from_sides(pier: &mut Pier, load: Triple, low: Option<f64>) {
    if let Some(low) = low {
        pier.sides[0] = add(pier.sides[0], times(load, low));
        pier.sides[1] = add(pier.sides[1], times(load, 1.0 - low));
    }
}
