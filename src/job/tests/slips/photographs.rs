//! Photographs: what is pointed at in them.

use super::{Slip, slip};

pub const SLIPS: &[Slip] = &[
    slip(
        "pointed at nothing",
        "[[assumptions]]",
        "[[photographs]]\nfile = \"nib.jpg\"\ncaption = \"Nib\"\nmarks = [{ of = \"R7\", at = [\"32 %\", \"60 %\"] }]\n\n\
         [[assumptions]]",
        "\"R7\"",
        &[
            "mark R7: there is no return, bearing, panel, floor edge or bracing wall \"R7\"",
            "name one that is there",
        ],
    ),
    slip(
        "pointed outside the picture",
        "[[assumptions]]",
        "[[photographs]]\nfile = \"nib.jpg\"\ncaption = \"Nib\"\nmarks = [{ of = \"R1\", at = [\"32 %\", \"160 %\"] }]\n\n\
         [[assumptions]]",
        "\"160 %\"",
        &["photograph nib.jpg, mark R1: `at, item 2` is 160 %", "0 % to 100 %"],
    ),
    slip(
        "pointed by bare numbers",
        "[[assumptions]]",
        "[[photographs]]\nfile = \"nib.jpg\"\ncaption = \"Nib\"\nmarks = [{ of = \"R1\", at = [\"32 %\", 60] }]\n\n\
         [[assumptions]]",
        "60",
        &["without a unit", "0 % to 100 %", "60 %"],
    ),
    slip(
        "pointed by one figure",
        "[[assumptions]]",
        "[[photographs]]\nfile = \"nib.jpg\"\ncaption = \"Nib\"\nmarks = [{ of = \"R1\", at = [\"32 %\"] }]\n\n[[assumptions]]",
        "[\"32 %\"]",
        &["`at` has 1 items", "[\"0 %\", \"6.4 %\"]"],
    ),
    slip(
        "marks on top of each other",
        "[[assumptions]]",
        "[[photographs]]\nfile = \"nib.jpg\"\ncaption = \"Nib\"\nmarks = [\n  { of = \"R1\", at = [\"32 %\", \"60 %\"] },\n  \
         { of = \"P2\", at = [\"30 %\", \"64 %\"] },\n]\n\n[[assumptions]]",
        "[\"30 %\", \"64 %\"]",
        &[
            "the marks of R1 and P2 stand on top of each other",
            "the other",
            "at least 5 % of the width or 7 % of the height apart",
            "where its part is seen alone",
        ],
    ),
    slip(
        "marks that are no tables",
        "[[assumptions]]",
        "[[photographs]]\nfile = \"nib.jpg\"\ncaption = \"Nib\"\nmarks = [\"R1\"]\n\n[[assumptions]]",
        "\"R1\"",
        &["[[photographs.marks]]"],
    ),
];
