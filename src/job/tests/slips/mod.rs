//! Slips of the hand, by sort.

mod bearings;
mod contradictions;
mod figures;
mod floors;
mod footings;
mod form;
mod names;
mod openings;
mod photographs;

/// A slip: the good job with `from` replaced by `to` once.
pub struct Slip {
    /// What is wrong, in a few words.
    pub name: &'static str,
    pub from: &'static str,
    pub to: &'static str,
    /// The text over the caret.
    pub caret: &'static str,
    /// What the message, the other place, what is allowed and the help say.
    pub says: &'static [&'static str],
}

const fn slip(
    name: &'static str,
    from: &'static str,
    to: &'static str,
    caret: &'static str,
    says: &'static [&'static str],
) -> Slip {
    Slip { name, from, to, caret, says }
}

/// Every slip.
pub fn all() -> impl Iterator<Item = &'static Slip> {
    [
        form::SLIPS,
        figures::SLIPS,
        names::SLIPS,
        contradictions::SLIPS,
        floors::SLIPS,
        bearings::SLIPS,
        footings::SLIPS,
        openings::SLIPS,
        photographs::SLIPS,
    ]
    .into_iter()
    .flatten()
}
