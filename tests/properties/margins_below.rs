//! Margins of bearings and footings: what the table prints passes when it is put into the building itself and the
//! sheet is worked again, everything on the way there too, and one step of print further it does not.

use perpend::building::{Building, Cause};
use perpend::checks::bearings::margins::Held;
use perpend::checks::footings::{self, margins};
use perpend::checks::margins::reach::{Step, Tried};
use perpend::checks::returns::build::{Change, Inputs};
use perpend::checks::{self, Job, bearings, outcome};
use perpend::quantity::{Force, Length, Stress};
use perpend::standards::annex::Annex;
use perpend::standards::masonry::Mortar;
use perpend::trace::{Entry, Sheet};

use crate::jobs;

/// Every demo job.
fn demos() -> Vec<(String, Building)> {
    let whole = |text: &str, name: &str| {
        checks::whole::complete(perpend::job::read(name, text).expect("a valid job"))
    };
    jobs::demos().into_iter().map(|(name, text)| (name.clone(), whole(&text, &name))).collect()
}

/// Rows of one mark: assumption, as it is, passes.
fn rows(sheet: &Sheet, mark: &str) -> Vec<[String; 3]> {
    let mut out = Vec::new();
    for entry in &sheet.entries {
        let Entry::Table(table) = entry else { continue };
        let mut inside = false;
        for row in &table.rows {
            inside = row[0] == mark || inside && row[0].is_empty();
            if inside {
                out.push([row[1].clone(), row[2].clone(), row[3].clone()]);
            }
        }
    }
    out
}

/// The number behind `way` in what a row says.
fn number(text: &str, way: &str) -> Option<f64> {
    let value = text.split(way).nth(1)?.split_whitespace().next()?.trim_end_matches([',', ';']);
    Some(value.replace('\u{2009}', "").parse().unwrap_or_else(|_| panic!("{text}")))
}

/// What a row says of one way: the value printed, and that one step of print beyond.
fn ends(said: &str, now: f64, way: &str, step: Step) -> Option<(f64, Option<f64>)> {
    let sign = if way == "down to" { -1.0 } else { 1.0 };
    let at = match number(said, way) {
        Some(value) => value,
        None if said.starts_with("no further") => now,
        None => return None,
    };
    let beyond = (!said.contains("not tried")).then(|| at + sign * step.at(at));
    Some((at, beyond))
}

/// Holds a row against the check: from as it is to what is printed it passes, beyond it does not.
fn held(what: &str, now: f64, end: (f64, Option<f64>), passes: impl Fn(f64) -> bool) {
    for n in 0..=4 {
        let x = now + (end.0 - now) * f64::from(n) / 4.0;
        assert!(passes(x), "{what}: {x} on the way to {}", end.0);
    }
    if let Some(beyond) = end.1 {
        assert!(!passes(beyond), "{what}: {beyond} still passes");
    }
}

fn margin_sheet(b: &Building) -> Sheet {
    let results = checks::run(b);
    results.sections.into_iter().find(|s| s.id == "margins").expect("margins").sheet
}

/// The bearing on its sheet, on the padstone that it has.
fn bearing_passes(b: &Building, mark: &str) -> bool {
    let mut s = Sheet::silent();
    let bearing = b.bearings.iter().find(|x| x.mark == mark).expect("a bearing");
    bearings::check(&mut s, b, &[bearing], &Annex::UK);
    s.holds() && !s.verdicts.is_empty()
}

#[test]
fn bearings_pass_as_far_as_the_table_says_and_no_further() {
    let mut seen = 0;
    for (name, mut b) in demos() {
        if b.bearings.is_empty() {
            continue;
        }
        let sheet = margin_sheet(&b);
        for n in 0..b.bearings.len() {
            let own = b.bearings[n].clone();
            let all = rows(&sheet, &own.mark);
            assert!(!all.is_empty(), "{name} {}", own.mark);
            let stone = Held::of(&b, &own, &Annex::UK).and_then(|h| h.stone().cloned());
            b.bearings[n].padstone = stone.is_some();
            let mut b = b.clone();
            b.padstones = stone.into_iter().collect();
            if !bearing_passes(&b, &own.mark) {
                assert_eq!(all.len(), 1, "{name} {}: {all:?}", own.mark);
                continue;
            }
            let r = b.returns.iter().position(|r| r.mark == own.on).expect("its return");
            let l = b.returns[r].loads.iter().position(|l| l.what == own.load).expect("its load");
            let load = b.returns[r].loads[l].clone();
            let with = |change: &dyn Fn(&mut Building)| {
                let mut other = b.clone();
                change(&mut other);
                bearing_passes(&other, &own.mark)
            };
            for [what, _, said] in &all {
                let name = format!("{name} {} {what}: {said}", own.mark);
                let at = |now: f64, way: &str, step: Step, change: &dyn Fn(&mut Building, f64)| {
                    let end = ends(said, now, way, step).unwrap_or_else(|| panic!("{name}"));
                    held(&name, now, end, |x| with(&|b| change(b, x)));
                };
                seen += 1;
                match what.split(' ').next().expect("words") {
                    "dead" => at(load.dead.base() / 1e3, "up to", Step::Digits, &|b, x| {
                        b.returns[r].loads[l].dead = Force::new(x * 1e3);
                    }),
                    "imposed" => at(load.imposed.base() / 1e3, "up to", Step::Digits, &|b, x| {
                        b.returns[r].loads[l].imposed = Force::new(x * 1e3);
                    }),
                    "load" => {
                        let e = load.eccentricity.base();
                        at(e.abs(), "up to", Step::Even(1.0), &|b, x| {
                            b.returns[r].loads[l].eccentricity = Length::new(x.copysign(e));
                        });
                    }
                    "length" => {
                        // The edge that is nearer to an end stays.
                        let half = own.length.base() / 2.0;
                        let to_end = b.returns[r].length.base() - load.at.base() - half;
                        let way = if to_end <= load.at.base() - half { 1.0 } else { -1.0 };
                        at(own.length.base(), "down to", Step::Even(1.0), &|b, x| {
                            b.bearings[n].length = Length::new(x);
                            b.returns[r].loads[l].at = load.at + Length::new(way * (half - x / 2.0));
                        });
                    }
                    "material" => {
                        let factors = checks::masonry::factors(&mut Sheet::silent(), &b);
                        let now = factors[0].0.base();
                        at(now, "up to", Step::Even(0.01), &|b, value| {
                            b.basis.gamma_m_compression = Some(Cause { value, reason: "Tried.".to_owned() });
                        });
                    }
                    "class" => {
                        let weaker =
                            |b: &mut Building| b.materials.iter_mut().for_each(|m| m.mortar = Mortar::M2);
                        if said == "down to M2" {
                            assert!(with(&weaker), "{name}");
                        } else if said.starts_with("not with M2") {
                            assert!(!with(&weaker), "{name}");
                        }
                    }
                    "wind" => assert_eq!(said, "no part of this check"),
                    other => panic!("{name}: {other}"),
                }
            }
        }
    }
    assert!(seen >= 40, "{seen} rows");
}

/// The footing on its sheet.
fn footing_passes(b: &Building, mark: &str) -> bool {
    let job = Job { drawn: false, ..Job::new(b) };
    let ret = b.returns.iter().find(|r| r.mark == mark).expect("a return");
    let section = footings::section(&job, ret).expect("a footing");
    outcome::holds_all(&section.sheet) && section.sheet.outside.is_empty()
}

#[test]
fn footings_pass_as_far_as_the_table_says_and_no_further() {
    let mut seen = 0;
    for (name, b) in demos() {
        if b.footings().next().is_none() {
            continue;
        }
        let sheet = margin_sheet(&b);
        for (r, ret) in b.returns.iter().enumerate().filter(|(_, r)| r.footing.is_some()) {
            let f = ret.footing.clone().expect("a footing");
            let all = rows(&sheet, &f.mark);
            assert!(!all.is_empty(), "{name} {}", f.mark);
            if !footing_passes(&b, &ret.mark) {
                assert_eq!(all.len(), 1, "{name} {}: {all:?}", f.mark);
                continue;
            }
            let with = |change: &dyn Fn(&mut Building)| {
                let mut other = b.clone();
                change(&mut other);
                footing_passes(&other, &ret.mark)
            };
            for [what, _, said] in &all {
                seen += 1;
                let name = format!("{name} {} {what}: {said}", f.mark);
                let at =
                    |said: &str, now: f64, way: &str, step: Step, change: &dyn Fn(&mut Building, f64)| {
                        let end = ends(said, now, way, step).unwrap_or_else(|| panic!("{name}"));
                        held(&name, now, end, |x| with(&|b| change(b, x)));
                    };
                let own = |b: &mut Building, change: &dyn Fn(&mut perpend::building::Footing)| {
                    change(b.returns[r].footing.as_mut().expect("a footing"));
                };
                match what.split(' ').next().expect("words") {
                    "net" => {
                        let job = Job { drawn: false, ..Job::new(&b) };
                        let i = Inputs::new(&job, ret, job.wind.as_ref().expect("wind"));
                        let now = i.wind.overall.base() * 1e3;
                        let wind = |q: f64| {
                            let change = Change { wind: q / now, ..Change::NONE };
                            margins::tried(&i, ret, &f, change) == Tried::Passes
                        };
                        match ends(said, now, "up to", Step::Digits) {
                            Some(end) => held(&name, now, end, wind),
                            // No wind, however strong, changes it.
                            None => {
                                assert!(wind(0.0) && wind(now * 8.0) && said.starts_with("no wind"), "{name}")
                            }
                        }
                    }
                    "length" => at(said, ret.length.base(), "down to", Step::Even(1.0), &|b, x| {
                        b.returns[r].length = Length::new(x);
                        for load in &mut b.returns[r].loads {
                            load.at = load.at * (x / ret.length.base());
                        }
                    }),
                    "width" => at(said, f.width.base(), "down to", Step::Even(1.0), &|b, x| {
                        own(b, &|f| f.width = Length::new(x));
                    }),
                    "wall" => {
                        let end = ends(said, 0.0, "by up to another", Step::Even(1.0)).expect("a row");
                        held(&name, 0.0, end, |x| {
                            [x, -x].iter().all(|x| {
                                with(&|b| own(b, &|footing| footing.offset = f.offset + Length::new(*x)))
                            })
                        });
                    }
                    "pressure" => {
                        at(said, f.allowable.value.base() * 1e3, "down to", Step::Digits, &|b, x| {
                            own(b, &|f| f.allowable.value = Stress::new(x / 1e3));
                        });
                    }
                    "dead" => {
                        let now = margins::dead_now(ret);
                        let scale = |b: &mut Building, x: f64| {
                            b.returns[r].loads.iter_mut().for_each(|l| l.dead = l.dead * (x / now));
                        };
                        let (least, most) = said.split_once("; ").expect("both ways");
                        if least == "without any of it" {
                            held(&name, now, (0.0, None), |x| with(&|b| scale(b, x)));
                        } else {
                            at(least, now, "down to", Step::Digits, &scale);
                        }
                        at(most, now, "up to", Step::Digits, &scale);
                    }
                    "imposed" => {
                        let now = margins::imposed_now(ret);
                        at(said, now, "up to", Step::Digits, &|b, x| {
                            b.returns[r].loads.iter_mut().for_each(|l| l.imposed = l.imposed * (x / now));
                        });
                    }
                    "material" => {
                        assert_eq!(said, "no part of this check");
                        let three = Some(Cause { value: 9.0, reason: "Tried.".to_owned() });
                        assert!(with(&|b| b.basis.gamma_m_compression.clone_from(&three)), "{name}");
                    }
                    "class" => {
                        if said == "down to M2" {
                            let weaker =
                                |b: &mut Building| b.materials.iter_mut().for_each(|m| m.mortar = Mortar::M2);
                            assert!(with(&weaker), "{name}");
                        }
                    }
                    other => panic!("{name}: {other}"),
                }
            }
        }
    }
    assert!(seen >= 50, "{seen} rows");
}

/// A heavier load never presses less: the use under a bearing and the pressure allowed that a footing needs.
#[test]
fn more_load_uses_no_less() {
    for (name, b) in demos() {
        for own in &b.bearings {
            let uses: Vec<f64> = (2..=12)
                .filter_map(|tenths| {
                    let mut other = b.clone();
                    for load in other.returns.iter_mut().flat_map(|r| &mut r.loads) {
                        if load.what == own.load {
                            load.imposed = load.imposed * (f64::from(tenths) / 5.0);
                        }
                    }
                    let mut s = Sheet::silent();
                    let own = other.bearings.iter().find(|x| x.mark == own.mark).expect("a bearing");
                    // On the masonry itself: another padstone would be another seat.
                    let bare = perpend::building::Bearing { padstone: false, ..own.clone() };
                    bearings::check(&mut s, &other, &[&bare], &Annex::UK);
                    s.verdicts.iter().find(|v| v.id == "bearing").map(|v| v.ratio)
                })
                .collect();
            assert!(uses.windows(2).all(|pair| pair[0] <= pair[1] + 1e-12), "{name} {}: {uses:?}", own.mark);
        }
        for (ret, f) in b.footings() {
            let job = Job { drawn: false, ..Job::new(&b) };
            let i = Inputs::new(&job, ret, job.wind.as_ref().expect("wind"));
            let softest: Vec<f64> = (5..=10)
                .filter_map(|tenths| {
                    let mut other = ret.clone();
                    other.loads.iter_mut().for_each(|l| l.imposed = l.imposed * (f64::from(tenths) / 5.0));
                    margins::allowable(&Inputs { ret: &other, ..i }, f).map(|r| r.value)
                })
                .collect();
            assert!(softest.windows(2).all(|pair| pair[0] <= pair[1]), "{name} {}: {softest:?}", f.mark);
        }
    }
}
