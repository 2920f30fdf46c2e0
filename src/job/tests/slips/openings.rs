//! Doors and windows of panels.

use super::{Slip, slip};

const FREE: &str = "right = { edge = \"simple\", reason = \"Nib R1, bonded; counted against moving only.\" }";
const BEFORE: &str = "sharing = \"strength\"\n\n[panels.before]";

pub const SLIPS: &[Slip] = &[
    slip(
        "opening outside its panel",
        BEFORE,
        "sharing = \"strength\"\nopenings = [{ at = \"2.4 m\", width = \"1.0 m\", height = \"2.0 m\" }]\n\n[panels.before]",
        "[{ at = \"2.4 m\", width = \"1.0 m\", height = \"2.0 m\" }]",
        &[
            "opening 1 lies outside the panel",
            "inside 3100 mm by 2400 mm",
            "correct the opening or the panel",
        ],
    ),
    slip(
        "opening higher than its panel",
        BEFORE,
        "sharing = \"strength\"\nopenings = [{ at = \"1.0 m\", width = \"1.0 m\", sill = \"0.9 m\", height = \"1.6 m\" }]\n\n[panels.before]",
        "[{ at = \"1.0 m\", width = \"1.0 m\", sill = \"0.9 m\", height = \"1.6 m\" }]",
        &["opening 1 lies outside the panel"],
    ),
    slip(
        "openings over each other",
        BEFORE,
        "sharing = \"strength\"\nopenings = [{ at = \"0.5 m\", width = \"1.0 m\", height = \"2.0 m\" }, { at = \"1.2 m\", width = \"0.9 m\", height = \"2.0 m\" }]\n\n[panels.before]",
        "[{ at = \"0.5 m\", width = \"1.0 m\", height = \"2.0 m\" }, { at = \"1.2 m\", width = \"0.9 m\", height = \"2.0 m\" }]",
        &["opening 2 overlaps the one to its left", "write them as one"],
    ),
    slip(
        "sliver between two openings",
        BEFORE,
        "sharing = \"strength\"\nopenings = [{ at = \"0.5 m\", width = \"0.8 m\", height = \"2.0 m\" }, { at = \"1.36 m\", width = \"0.9 m\", height = \"2.0 m\" }]\n\n[panels.before]",
        "[{ at = \"0.5 m\", width = \"0.8 m\", height = \"2.0 m\" }, { at = \"1.36 m\", width = \"0.9 m\", height = \"2.0 m\" }]",
        &["the masonry to the right of opening 1 is 60 mm wide", "at least 100 mm", "not counted on"],
    ),
    slip(
        "opening that touches the end",
        BEFORE,
        "sharing = \"strength\"\nopenings = [{ at = \"0 m\", width = \"0.8 m\", height = \"2.0 m\" }]\n\n[panels.before]",
        "[{ at = \"0 m\", width = \"0.8 m\", height = \"2.0 m\" }]",
        &["the masonry to the left of opening 1 is 0 mm wide", "with a free edge there"],
    ),
    slip(
        "frame of a kind that is not there",
        BEFORE,
        "sharing = \"strength\"\nopenings = [{ at = \"1.0 m\", width = \"0.8 m\", height = \"2.0 m\", frame = \"jamb\" }]\n\n[panels.before]",
        "\"jamb\"",
        &["\"jambs\"", "\"head and sill\""],
    ),
    slip(
        "lintel that bears on more than there is",
        BEFORE,
        "sharing = \"strength\"\nopenings = [{ at = \"0.2 m\", width = \"0.8 m\", height = \"2.0 m\", lintel = \"300 mm\" }]\n\n[panels.before]",
        "[{ at = \"0.2 m\", width = \"0.8 m\", height = \"2.0 m\", lintel = \"300 mm\" }]",
        &["the lintel of opening 1 bears 300 mm at either end", "at most 200 mm", "under one lintel as one"],
    ),
    slip(
        "stretch of an edge that is free",
        FREE,
        "right = { edge = \"free\", reason = \"x\", from = \"0 m\", to = \"1 m\" }",
        "\"free\"",
        &["a stretch is given of an edge that is free", "the rest is free"],
    ),
    slip(
        "dpc at the side",
        FREE,
        "right = { edge = \"dpc\", reason = \"x\" }",
        "\"dpc\"",
        &["`right` is held at a dpc", "only the base can be"],
    ),
    slip(
        "stretch with one end",
        FREE,
        "right = { edge = \"simple\", reason = \"x\", from = \"0 m\" }",
        "{ edge = \"simple\", reason = \"x\", from = \"0 m\" }",
        &["`to`"],
    ),
    slip(
        "stretch beyond its edge",
        FREE,
        "right = { edge = \"simple\", reason = \"x\", from = \"0 m\", to = \"9 m\" }",
        "{ edge = \"simple\", reason = \"x\", from = \"0 m\", to = \"9 m\" }",
        &["`right` is held from 0 mm to 9000 mm", "a stretch of at least 200 mm", "correct the stretch"],
    ),
];
