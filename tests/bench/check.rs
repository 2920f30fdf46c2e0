//! Reading, checking and drawing.

use divan::{Bencher, black_box};
use perpend::checks::returns::build::Inputs;
use perpend::checks::returns::{self, remedy};
use perpend::checks::{self, Job, LIST};
use perpend::job;
use perpend::trace::Sheet;

use super::jobs;

pub(super) fn demo(name: &str) -> String {
    jobs::demos().into_iter().find(|(n, _)| n == name).expect("a demo job").1
}

const NAMES: [&str; 8] = [
    "bungalow",
    "concrete-hall",
    "end-terrace",
    "hold-points",
    "lime-terrace",
    "rear-opening",
    "semi",
    "short-nib",
];

/// Job file to building.
#[divan::bench]
fn read(bencher: Bencher<'_, '_>) {
    let text = demo("rear-opening");
    bencher.bench(|| job::read("job.toml", black_box(&text)));
}

/// Job file to results: what `perpend check` does.
#[divan::bench(args = NAMES)]
fn whole(bencher: Bencher<'_, '_>, name: &str) {
    let text = demo(name);
    bencher.bench(|| perpend::check("job.toml", black_box(&text)));
}

/// One kind of sheet, by its place in the list of checks; drawings included.
#[divan::bench(args = 0..LIST.len())]
fn kind(bencher: Bencher<'_, '_>, n: usize) {
    let building = job::read("job.toml", &demo("end-terrace")).expect("a valid job");
    let job = Job::new(&building);
    bencher.bench(|| LIST[n](black_box(&job)));
}

/// What stands before the sheets: wind, storey, the whole building, hold points.
#[divan::bench]
fn before_the_sheets(bencher: Bencher<'_, '_>) {
    let building = job::read("job.toml", &demo("end-terrace")).expect("a valid job");
    bencher.bench(|| Job::new(black_box(&building)).holds.len());
}

fn with_inputs(name: &str, run: impl FnOnce(&Inputs<'_>)) {
    let building = job::read("job.toml", &demo(name)).expect("a valid job");
    let job = Job::new(&building);
    let wind = job.wind.as_ref().expect("wind within the method").worst;
    run(&Inputs {
        building: &building,
        ret: &building.returns[0],
        wind,
        storey: job.sharing(),
        annex: &job.annex,
    });
}

/// One return, every check in every case, nothing printed: what a search runs at each try.
#[divan::bench]
fn one_return_silent(bencher: Bencher<'_, '_>) {
    with_inputs("rear-opening", |inputs| {
        bencher.bench(|| returns::remedy::passes(black_box(inputs), returns::build::Change::NONE));
    });
}

/// One return on a sheet.
#[divan::bench]
fn one_return_recorded(bencher: Bencher<'_, '_>) {
    with_inputs("rear-opening", |inputs| {
        bencher.bench(|| returns::check(&mut Sheet::recorder(), black_box(inputs)));
    });
}

/// What would make a return pass.
#[divan::bench]
fn remedies(bencher: Bencher<'_, '_>) {
    with_inputs("short-nib", |inputs| bencher.bench(|| remedy::table(black_box(inputs))));
}

/// All sections from a building.
#[divan::bench]
fn building_to_sections(bencher: Bencher<'_, '_>) {
    let building = job::read("job.toml", &demo("rear-opening")).expect("a valid job");
    bencher.bench(|| checks::run(black_box(&building)));
}

/// A row of rooms led down to the ground, by the number of its walls.
#[divan::bench(args = [10, 100, 1000])]
fn lead_down(bencher: Bencher<'_, '_>, walls: usize) {
    use perpend::solve::descent::{self, Axis, Floor, Model, Place, Wall};
    let storeys = 2;
    let rooms = (walls / storeys).saturating_sub(1).max(1);
    let mut model = Model { storeys, reach: 150.0, ..Model::default() };
    for storey in 0..storeys {
        for i in 0..=rooms {
            let place = Place { along: Axis::Y, at: 3000.0 * i as f64, from: 0.0, to: 6000.0 };
            model.walls.push(Wall { storey, place, thickness: 100.0, weight: 5.0, openings: Vec::new() });
        }
        for i in 0..rooms {
            let x = (3000.0 * i as f64, 3000.0 * (i + 1) as f64);
            model.floors.push(Floor { storey, x, y: (0.0, 6000.0), spans: Axis::X, load: [1e-3, 2e-3, 0.0] });
        }
    }
    bencher.bench(|| descent::lead_down(black_box(&model)).expect("a path"));
}
