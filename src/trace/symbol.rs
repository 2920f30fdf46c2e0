//! From names in the code to symbols on paper: `gamma_M` is gamma with the subscript M.

/// Greek letters by name, with the letter.
pub const GREEK: &[(&str, &str)] = &[
    ("alpha", "α"),
    ("beta", "β"),
    ("gamma", "γ"),
    ("delta", "δ"),
    ("eta", "η"),
    ("theta", "θ"),
    ("lambda", "λ"),
    ("mu", "μ"),
    ("nu", "ν"),
    ("xi", "ξ"),
    ("rho", "ρ"),
    ("sigma", "σ"),
    ("tau", "τ"),
    ("phi", "φ"),
    ("psi", "ψ"),
    ("Phi", "Φ"),
    ("Delta", "Δ"),
];

/// Base and subscript of a name: the first underscore parts them, later ones become commas; Greek
/// names in the subscript become letters.
pub fn split(name: &str) -> (String, String) {
    match name.split_once('_') {
        Some((base, sub)) => (base.to_owned(), sub.split('_').map(letter).collect::<Vec<_>>().join(",")),
        None => (name.to_owned(), String::new()),
    }
}

/// The letter of a base: Greek by name, others as they are.
pub fn letter(base: &str) -> &str {
    GREEK.iter().find(|g| g.0 == base).map_or(base, |g| g.1)
}

/// What a symbol means, for the list of symbols; `None` where the glossary lacks it.
pub fn meaning(name: &str) -> Option<&'static str> {
    super::glossary::GLOSSARY.iter().find(|g| g.0 == name).map(|g| g.1)
}
