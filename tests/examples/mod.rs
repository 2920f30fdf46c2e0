//! Published examples, a file per source: each number with its page and tolerance. Beside them hand
//! calculations, step by step, and identities that only test the tool against itself, named as such.

mod arya_design_of_structural_elements;
mod flanged_sections;
mod hand_bearing;
pub mod hand_diaphragm;
pub mod hand_floor_edge;
mod hand_footing;
mod hand_frame;
mod hand_neighbours;
pub mod hand_openings;
mod hand_panel;
mod hand_pier;
mod hand_reactions;
mod hand_return;
mod hand_slenderness;
mod hand_stability;
mod hand_takedown;
mod hand_wind;
mod hand_wind_house;
pub mod job;
mod johansen;
mod roberts_v3;
mod self_consistency;
mod ssb_part3;
mod taly_reinforced_masonry;
