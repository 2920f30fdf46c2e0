//! The job text that the hand examples and the properties vary: one return in a plain invented house.

/// A job with one return `R1`. Lines of `[[returns]]`, its loads and its junction are given by the test;
/// the rest stands here, with all that a hand calculation needs.
///
/// Front 8 m, walls at 0, 3 and 8 m, so that R1 (at 3 m) takes (3 + 5)/2 = 4 m of 8 m: a share of 0.5.
pub fn with_return(build_up: &str, lines: &str) -> String {
    // As a bracing wall R1 has the length and the height that it has as a return.
    let line = |key: &str| lines.lines().find(|l| l.starts_with(key)).unwrap_or("");
    let bracing = format!("{BRACING}{}\n{}\n", line("length = "), line("height = "));
    format!("{HEAD}{build_up}{HOUSE}{bracing}{lines}{CHAIN}")
}

/// A single leaf of 140 mm block.
pub const BLOCK_140: &str = r#"
[build_ups.wall]
[[build_ups.wall.leaves]]
material = "block"
thickness = "140 mm"
"#;

/// A plain return that takes hardly any wind, for examples that are about something else.
pub const PLAIN_RETURN: &str = r#"
[[returns]]
mark = "R1"
title = "Return"
build_up = "wall"
storey = "ground"
length = "1200 mm"
height = "2.5 m"
base = "dpc"
head = "free"
path = "sideways"
tributary_width = "0.1 m"
restraint = "timber floor"
supported_wall_height = "5 m"

[returns.junction]
to = "front wall"
bonded = false
proof = "seen"
words = "Butted."
thickness = "140 mm"
left = "2 m"
right = "2 m"
dead = "9 kN/m"
"#;

const HEAD: &str = r#"
[job]
number = "7001"
title = "One return by hand"
address = ["1 Example Row", "Nowhere"]
client = "Nobody"
authority = "Nobody"
status = "preliminary"
building = "An invented house."
work = "An invented removal."

[signatures.made]
name = "A. Maker"
letters = "AM"
date = 2026-03-02

[[revisions]]
letter = "A"
date = 2026-03-03
note = "First issue"

[wind]
route = "stated"
[wind.stated]
overall = "0.60 kN/m2"
panel = "0.70 kN/m2"
reason = "Invented for the example."

[materials.block]
unit = "aggregate block"
group = 1
strength = "10 N/mm2"
strength_is = "normalised"
mortar = "M4"
density = "20 kN/m3"
"#;

const HOUSE: &str = r#"
[[storeys]]
mark = "ground"
clear_height = "2.5 m"
floor_above = "timber"
total_height = "6.25 m"

[removed]
wall = "cross wall"
build_up = "wall"
length = "2 m"
storey = "ground"
carried = "A floor."
braced = "The front wall."

[stability]
storey = "ground"
wind_along = "y"
front = ["0 m", "8 m"]
strip_height = "2.6 m"
share_by = "tributary width"
storeys_above_force = "5 kN"
vertical_load_dead = "200 kN"
vertical_load_imposed = "80 kN"

[[bracing]]
mark = "left wall"
along = "y"
at = "0 m"
length = "7 m"
height = "2.5 m"
build_up = "wall"
stands = "before and after"

[[bracing]]
mark = "right wall"
along = "y"
at = "8 m"
length = "7 m"
height = "2.5 m"
build_up = "wall"
stands = "before and after"

[[bracing]]
mark = "cross wall"
along = "y"
at = "3 m"
length = "6 m"
height = "2.5 m"
build_up = "wall"
stands = "before"
"#;

const BRACING: &str = r#"
[[bracing]]
mark = "R1"
along = "y"
at = "3 m"
build_up = "wall"
stands = "after"
"#;

const CHAIN: &str = r#"
[[links]]
link = "wind face"
proof = "calculated"
"#;
