//! Published examples, a file per source: each number with its page and tolerance.

mod arya_design_of_structural_elements;
mod johansen;
mod roberts_v3;
mod ssb_part3;
mod taly_reinforced_masonry;
