//! Job files for tests and benchmarks: the demo jobs, and variations of them made from a number.

#![allow(dead_code, reason = "each test binary uses a part of this")]

use std::path::PathBuf;

/// The folder of the demo jobs.
pub fn folder() -> PathBuf {
    PathBuf::from(env!("CARGO_MANIFEST_DIR")).join("jobs")
}

/// Every demo job, its name without ending and its text, in alphabetical order.
pub fn demos() -> Vec<(String, String)> {
    let entries = std::fs::read_dir(folder()).expect("the demo jobs are there");
    let mut paths: Vec<PathBuf> = entries.map(|entry| entry.expect("a readable folder").path()).collect();
    paths.retain(|path| path.extension().is_some_and(|e| e == "toml"));
    paths.sort();
    assert!(!paths.is_empty());
    let name = |path: &PathBuf| path.file_stem().expect("a file name").to_string_lossy().into_owned();
    paths.iter().map(|path| (name(path), std::fs::read_to_string(path).expect("a readable job"))).collect()
}

/// The job that `perpend start` writes.
pub const START: &str = include_str!("../../jobs/rear-opening.toml");

/// A valid job that differs from a demo job in most of its figures, in its titles and in how many loads, hold points
/// and assumptions it has. The same number gives the same job.
pub fn varied(seed: u64) -> String {
    // A plan with floors hangs together: its figures are not free.
    let mut demos = demos();
    demos.retain(|(_, text)| !text.contains("\n[area_loads."));
    let (_, text) = &demos[usize::try_from(seed).expect("a small number") % demos.len()];
    // Earlier packs lie beside the demo jobs alone.
    let text: String = text.lines().filter(|l| !l.starts_with("pack = ")).map(|l| format!("{l}\n")).collect();
    Variation::new(seed).of(&text)
}

/// Splitmix64: public domain, by Sebastiano Vigna; good enough to choose figures.
struct Dice(u64);

impl Dice {
    fn roll(&mut self) -> u64 {
        self.0 = self.0.wrapping_add(0x9e37_79b9_7f4a_7c15);
        let z = (self.0 ^ (self.0 >> 30)).wrapping_mul(0xbf58_476d_1ce4_e5b9);
        let z = (z ^ (z >> 27)).wrapping_mul(0x94d0_49bb_1331_11eb);
        z ^ (z >> 31)
    }

    fn below(&mut self, n: u64) -> u64 {
        self.roll() % n
    }

    #[allow(clippy::cast_precision_loss, reason = "53 bits fit")]
    fn between(&mut self, low: f64, high: f64) -> f64 {
        low + (high - low) * (self.roll() >> 11) as f64 / (1_u64 << 53) as f64
    }

    /// A title of `words` words.
    fn title(&mut self, words: u64) -> String {
        const WORDS: [&str; 14] = [
            "rear",
            "opening",
            "between",
            "scullery",
            "and",
            "breakfast room",
            "with",
            "longer",
            "nibs",
            "below",
            "landing",
            "chimney breast",
            "at",
            "Wetherington Crescent",
        ];
        let all: Vec<&str> =
            (0..words).map(|_| WORDS[usize::try_from(self.below(14)).expect("below 14")]).collect();
        all.join(" ")
    }
}

struct Variation {
    seed: u64,
    dice: Dice,
    wind: f64,
    panel: f64,
    /// The job states a pressure.
    stated: bool,
    /// The returns stand among the bracing walls too, with the same length.
    lengths_twice: bool,
}

impl Variation {
    fn new(seed: u64) -> Self {
        let mut dice = Dice(seed);
        let (wind, panel) = (dice.between(0.1, 1.5), dice.between(0.5, 1.0));
        Self { seed, dice, wind, panel, stated: false, lengths_twice: false }
    }

    fn of(&mut self, text: &str) -> String {
        self.stated = text.contains("[wind.stated]");
        self.lengths_twice = text.contains("[[bracing]]\nmark = \"R");
        let mut out = String::new();
        let mut section = String::new();
        for line in text.lines() {
            if let Some(header) = line.strip_prefix('[') {
                section = header.trim_start_matches('[').split(']').next().unwrap_or_default().to_owned();
                if section == "returns.junction" {
                    self.more_loads(&mut out);
                }
            }
            out.push_str(&self.line(&section, line));
            out.push('\n');
        }
        for _ in 0..self.dice.below(4).saturating_sub(1) {
            let text = self.dice.title(12);
            out.push_str(&format!("\n[[hold_points]]\ntext = \"Before the wall comes down: {text}.\"\n"));
        }
        for _ in 0..self.dice.below(6) {
            let (text, source) = (self.dice.title(15), self.dice.title(4));
            out.push_str(&format!("\n[[assumptions]]\ntext = \"{text}.\"\nsource = \"{source}\"\n"));
        }
        out
    }

    fn more_loads(&mut self, out: &mut String) {
        for n in 0..self.dice.below(5) {
            let (what, dead, imposed) =
                (self.dice.title(2), self.dice.between(0.5, 15.0), self.dice.between(0.0, 8.0));
            let at = self.dice.between(20.0, 430.0);
            out.push_str(&format!(
                "[[returns.loads]]\nwhat = \"{what} {n}\"\ndead = \"{dead:.1} kN\"\nimposed = \"{imposed:.1} kN\"\n\
                 at = \"{at:.0} mm\"\n\n"
            ));
        }
    }

    /// One line, its figure changed where it may be.
    fn line(&mut self, section: &str, line: &str) -> String {
        let Some((key, value)) = line.split_once('=').map(|(k, v)| (k.trim(), v.trim())) else {
            return line.to_owned();
        };
        let times = |value: &str, factor: f64, decimals: usize| {
            let typed = value.split('"').nth(1).expect("a quantity in quotes");
            let (number, unit) = typed.split_once(' ').expect("a number and a unit");
            let number: f64 = number.parse().expect("a number");
            format!("{key} = \"{:.decimals$} {unit}\"", number * factor)
        };
        let material = section.starts_with("materials.");
        match (section, key) {
            ("job", "number") => format!("number = \"V{:04}\"", self.seed),
            ("job", "title") => format!("title = \"{}\"", self.job_title()),
            ("returns" | "panels", "title") => {
                let words = 1 + self.dice.below(7);
                format!("title = \"{}\"", self.dice.title(words))
            }
            ("wind.stated", "overall" | "panel") => times(value, self.wind, 3),
            // Where a stated pressure stands beside the site, either may decide.
            ("wind", "route") if self.stated && self.dice.below(2) == 0 => "route = \"stated\"".to_owned(),
            ("wind.site", "v_map") => format!("v_map = \"{:.1} m/s\"", self.dice.between(15.0, 24.0)),
            (_, "strength") if material => times(value, self.dice.between(0.8, 1.6), 1),
            ("returns", "length") if !self.lengths_twice => times(value, self.dice.between(1.0, 1.9), 0),
            ("returns.loads", "dead" | "imposed") => times(value, self.dice.between(0.3, 2.0), 1),
            ("panels.before" | "panels.after", "length" | "wall_at") => times(value, self.panel, 2),
            ("panels", "dead_above") => times(value, self.dice.between(0.5, 3.0), 1),
            ("stability", "vertical_load_dead") => times(value, self.dice.between(0.7, 1.5), 0),
            _ => line.to_owned(),
        }
    }

    /// Two words to a line and a half.
    fn job_title(&mut self) -> String {
        let words = 2 + self.dice.below(10);
        let mut title = self.dice.title(words);
        // 120 letters are allowed; all of these are ASCII.
        title.truncate(110);
        title.trim_end().to_owned()
    }
}
