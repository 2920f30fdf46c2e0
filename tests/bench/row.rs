//! Time by the number of walls: the end terrace with more and more houses beside it, read, led down, checked.

use std::fmt::Write;

use divan::{Bencher, black_box};

use super::check::demo;

/// Two storeys.
#[divan::bench(args = [10, 20, 100, 1000], max_time = 20)]
fn plan_walls(bencher: Bencher<'_, '_>, walls: usize) {
    let text = row(walls);
    bencher.bench(|| perpend::check("row.toml", black_box(&text)).expect("a valid job"));
}

/// Three storeys; nearly every wall stands in all of them.
#[divan::bench(args = [10, 60, 100, 1000], max_time = 20)]
fn plan_walls_three_storeys(bencher: Bencher<'_, '_>, walls: usize) {
    let text = higher(&row(walls));
    assert_eq!(text.matches("[[plan.walls]]").count(), walls);
    bencher.bench(|| perpend::check("row.toml", black_box(&text)).expect("a valid job"));
}

/// The end terrace's job with houses added to its left until the plan has so many walls.
fn row(walls: usize) -> String {
    let text = demo("end-terrace");
    let (plan, rest) = text.split_once("[[plan.floors]]").expect("the job has floors");
    let mut more = String::new();
    let wanted = walls.saturating_sub(text.matches("[[plan.walls]]").count());
    let mut wall = |mark: &str, n: usize, from: (f64, f64), to: (f64, f64)| {
        let point = |(x, y): (f64, f64)| format!("[\"{x} m\", \"{y} m\"]");
        let (from, to) = (point(from), point(to));
        let _ = writeln!(
            more,
            "[[plan.walls]]\nmark = \"{mark} {n}\"\nbuild_up = \"one brick wall\"\nfrom = {from}\nto = {to}\n"
        );
    };
    // Narrow houses in rows: the plan has room for 100 m each way.
    let house = |n: usize| (-2.0 - 2.0 * (n % 45) as f64, 9.0 * (n / 45) as f64);
    // Rows after the first begin with a wall of their own.
    let ends = |houses: usize| houses.saturating_sub(1) / 45;
    let houses = (0..=wanted / 3).rev().find(|&n| 3 * n + ends(n) <= wanted).unwrap_or(0);
    for n in 0..houses {
        let (x, y) = house(n);
        let (z, top) = (x + 2.0, y + 8.0);
        wall("rear", n, (x, y), (z, y));
        wall("front", n, (x, top), (z, top));
        wall("side", n, (x, y), (x, top));
        if n > 0 && n % 45 == 0 {
            wall("end", n, (z, y), (z, top));
        }
    }
    // What is left over divides the first houses.
    for n in 0..wanted - 3 * houses - ends(houses) {
        let (x, y) = house(n);
        wall("middle", n, (x + 0.4, y + 4.0), (x + 1.6, y + 4.0));
    }
    for n in 0..houses {
        let (x, y) = house(n);
        more += &floor(&format!("F {n}"), "first floor", "ground", (x, y), (x + 2.0, y + 8.0));
        more += &floor(&format!("R {n}"), "roof", "first", (x, y), (x + 2.0, y + 8.0));
    }
    format!("{plan}{more}[[plan.floors]]{rest}")
}

fn floor(mark: &str, load: &str, storey: &str, from: (f64, f64), to: (f64, f64)) -> String {
    format!(
        "[[plan.floors]]\nmark = \"{mark}\"\nload = \"{load}\"\nstorey = \"{storey}\"\nfrom = [\"{} m\", \"{} \
         m\"]\nto = [\"{} m\", \"{} m\"]\nspans = \"y\"\n\n",
        from.0, from.1, to.0, to.1
    )
}

/// The same job with a storey more: what was the roof is a floor, with the roof over the storey above it.
fn higher(text: &str) -> String {
    let storey =
        "mark = \"first\"\nclear_height = \"2.40 m\"\nfloor_above = \"roof\"\ntotal_height = \"4.90 m\"\n";
    let storeys = format!(
        "{}\n[[storeys]]\n{}",
        storey.replacen("\"roof\"", "\"timber\"", 1).replacen("4.90", "7.60", 1),
        storey.replacen("\"first\"", "\"second\"", 1)
    );
    let text = text
        .replacen("total_height = \"7.60 m\"", "total_height = \"10.30 m\"", 1)
        .replacen(storey, &storeys, 1)
        .replacen("storeys = [\"first\"]", "storeys = [\"first\", \"second\"]", 1);
    let (plan, rest) = text.split_once("[[plan.beams]]").expect("the job has a beam");
    let mut out = String::new();
    let mut parts = plan.split("[[plan.floors]]");
    out += parts.next().unwrap_or_default();
    for part in parts {
        let roof = part.contains("load = \"roof\"");
        if roof {
            out += "[[plan.floors]]";
            out += &part.replacen("mark = \"", "mark = \"U", 1).replacen(
                "load = \"roof\"",
                "load = \"first floor\"",
                1,
            );
        }
        out += "[[plan.floors]]";
        out += &if roof {
            part.replacen("storey = \"first\"", "storey = \"second\"", 1)
        } else {
            part.to_owned()
        };
    }
    format!("{out}[[plan.beams]]{rest}")
}
