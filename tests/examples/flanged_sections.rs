//! Flanged returns against figures of a general library for cross-sections: sectionproperties 3.10.2,
//! by the script tests/data/flanged_sections.py.

use perpend::quantity::{Force, Length};
use perpend::standards::en1996::section::{Section, triangle};
use perpend::trace::Sheet;
use serde::Deserialize;

#[derive(Deserialize)]
struct Row {
    b_1: f64,
    d_1: f64,
    b_2: f64,
    L_s: f64,
    area: f64,
    centroid: f64,
    second_moment: f64,
}

fn rows() -> Vec<Row> {
    serde_json::from_str(include_str!("../data/flanged_sections.json")).expect("figures of the library")
}

impl Row {
    fn section(&self) -> Section {
        let mm = Length::new;
        Section { b_1: mm(self.b_1), d_1: mm(self.d_1), b_2: mm(self.b_2), L_s: mm(self.L_s) }
    }
}

#[test]
fn centroids_agree() {
    let rows = rows();
    assert_eq!(rows.len(), 7);
    for row in &rows {
        let y = row.section().centroid().base();
        assert!((y - row.centroid).abs() < 1e-6 * row.L_s, "{y} mm, the library has {}", row.centroid);
    }
}

/// Where the whole section stays pressed the stress at the toe is N/A + N e y/I, with the library's A, y and I.
#[test]
fn uncracked_stresses_agree() {
    for row in rows() {
        let n = 40e3;
        let far = row.L_s - row.centroid;
        // The kern: N anywhere nearer to the centroid presses all of it.
        let kern = row.second_moment / (row.area * far);
        for share in [0.1, 0.5, 0.95] {
            let e = share * kern;
            let a = Length::new(row.centroid - e);
            let mut s = Sheet::silent();
            let t = triangle(&mut s, row.section(), Force::new(n), a).expect("N inside the section");
            let toe = n / row.area + n * e * row.centroid / row.second_moment;
            let got = t.sigma_toe.base();
            assert!((got - toe).abs() < 1e-6 * toe, "{got} N/mm², by the library {toe}");
            assert!(t.c.base() >= row.L_s - 1e-6, "the whole depth is pressed");
        }
    }
}
