//! Footings.

use super::{Slip, slip};

pub const SLIPS: &[Slip] = &[
    slip(
        "footing without its width",
        "width = \"450 mm\"\n",
        "",
        "",
        &["return R1, footing: `width` is missing", "a length with its unit"],
    ),
    slip(
        "footing width without unit",
        "width = \"450 mm\"",
        "width = 450",
        "450",
        &["return R1, footing: `width` is the number 450 without a unit", "width = \"450 mm\""],
    ),
    slip(
        "allowable pressure without reason",
        "allowable = { value = \"100 kN/m2\", reason = \"Stiff clay.\" }",
        "allowable = \"100 kN/m2\"",
        "\"100 kN/m2\"",
        &["`allowable` is the text \"100 kN/m2\", which departs from the rule without a reason"],
    ),
    slip(
        "allowable pressure per metre",
        "value = \"100 kN/m2\"",
        "value = \"100 kN/m\"",
        "\"100 kN/m\"",
        &["has the unit kN/m, which is not that of a pressure"],
    ),
    slip(
        "footing runs on without reason",
        "beyond_free_end = { value = \"120 mm\", reason = \"The old strip runs on.\" }",
        "beyond_free_end = \"120 mm\"",
        "\"120 mm\"",
        &["`beyond_free_end` is the text \"120 mm\"", "without a reason"],
    ),
    slip(
        "footing narrower than its wall",
        "width = \"450 mm\"",
        "width = \"90 mm\"",
        "\"90 mm\"",
        &["it is narrower than the wall that stands on it", "that wall is 100.0 mm thick"],
    ),
    slip(
        "wall beyond the edge of its footing",
        "offset = \"20 mm\"",
        "offset = \"-200 mm\"",
        "\"-200 mm\"",
        &["the wall stands beyond its edge", "that wall is 100.0 mm thick"],
    ),
    slip(
        "footing calculated",
        "proof = \"seen\"\nwords = \"Trial hole, RH.\"",
        "proof = \"calculated\"\nwords = \"Trial hole, RH.\"",
        "\"calculated\"",
        &["`proof` is \"calculated\"", "\"seen\" or \"assumed\""],
    ),
    slip(
        "footing without a witness",
        "words = \"Trial hole, RH.\"\n",
        "",
        "",
        &["return R1, footing: `words` is missing"],
    ),
    slip(
        "load before without imposed load",
        "before = { dead = \"14 kN/m\", imposed = \"5 kN/m\" }",
        "before = { dead = \"14 kN/m\" }",
        "",
        &["return R1, footing, before: `imposed` is missing"],
    ),
    slip(
        "footing with the mark of a return",
        "mark = \"F1\"",
        "mark = \"r2\"",
        "\"r2\"",
        &["two things have the mark \"r2\"", "a return"],
    ),
    slip(
        "two footings of one mark",
        "dead = \"6.5 kN/m\"\n",
        "dead = \"6.5 kN/m\"\n\n[returns.footing]\nmark = \"F1\"\nwidth = \"450 mm\"\nthickness = \"150 mm\"\nallowable = { value = \"100 kN/m2\", reason = \"Stiff clay.\" }\nproof = \"seen\"\nwords = \"RH.\"\n",
        "",
        &["two footings have the mark \"F1\"", "here again"],
    ),
    slip(
        "heavy footing",
        "thickness = \"150 mm\"\nbeyond",
        "thickness = \"150 mm\"\ndensity = { value = \"40 kN/m3\", reason = \"Old iron in it.\" }\nbeyond",
        "\"40 kN/m3\"",
        &["return R1, footing, `density`: `value` is 40 kN/m3", "15 kN/m3 to 27 kN/m3"],
    ),
    slip(
        "entry of a footing misspelt",
        "offset = \"20 mm\"",
        "ofset = \"20 mm\"",
        "ofset",
        &["return R1, footing: nobody reads an entry `ofset`", "write `offset`"],
    ),
];
