//! EN 1992-1-1 with the UK National Annex: as much as a padstone needs.

use crate::quantity::{Num, Stress};
use crate::standards::annex::Annex;
use crate::trace::Sheet;
use crate::{calc, given};

/// The edition printed where a padstone is checked.
pub const EDITION: &str = "BS EN 1992-1-1:2004+A1:2014 with UK National Annex, for the concrete of padstones";

/// Design compressive strength of plain concrete, `f_cd = alpha_cc f_ck/gamma_C`; `f_ck` stands on the sheet.
///
/// 12.3.1(1) with 3.1.6(1); alpha 0.6 and gamma_C 1.5 in the UK. From memory, check against the standard.
pub fn plain_strength(s: &mut Sheet, annex: &Annex, f_ck: Stress) -> Stress {
    given!(
        s,
        "coefficient of plain concrete, UK",
        "EN 1992-1-1 12.3.1(1), UK NA",
        alpha_cc = Num::new(annex.alpha_cc_plain)
    );
    given!(s, "material factor, concrete", "EN 1992-1-1 2.4.2.4, UK NA", gamma_C = Num::new(annex.gamma_C));
    calc!(s, "EN 1992-1-1 12.3.1(1)", "design strength, plain", f_cd = alpha_cc * f_ck / gamma_C);
    f_cd
}

#[cfg(test)]
mod tests {
    use super::*;

    /// 0.6 x 25/1.5 = 10 N/mm².
    #[test]
    fn strength_by_hand() {
        let f_cd = plain_strength(&mut Sheet::silent(), &Annex::UK, Stress::new(25.0));
        assert!((f_cd.base() - 10.0).abs() < 1e-12);
    }
}
