//! Heights that follow from the storeys.

use std::borrow::Borrow;

use super::Storey;
use crate::quantity::Length;

/// Height of wall from one floor to the next; the clear height under the roof.
pub fn storey_height<S: Borrow<Storey>>(storeys: &[S], k: usize) -> Length {
    let here = storeys[k].borrow();
    storeys.get(k + 1).map_or(here.clear_height, |above| here.total_height - above.borrow().total_height)
}

/// Height of wind face that the floor over storey `k` collects: half this storey, half the next or up to the ridge.
pub fn strip_height<S: Borrow<Storey>>(storeys: &[S], k: usize) -> Length {
    let here = storeys[k].borrow();
    let over = if k + 1 < storeys.len() {
        storey_height(storeys, k + 1) / 2.0
    } else {
        // Up to the ridge, as an upright face: on the safe side.
        here.total_height - here.clear_height
    };
    storey_height(storeys, k) / 2.0 + over
}
