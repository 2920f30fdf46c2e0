//! How hard words are to read: long sentences and signs that are no words.

/// Most words in a sentence for the client.
pub const WORDS: usize = 25;

/// What makes a sentence hard.
#[derive(Clone, Debug, PartialEq, Eq)]
pub enum Hard {
    /// More words than [`WORDS`]: how many.
    Long(usize),
    /// A sign that is neither a word, a number nor plain punctuation.
    Sign(char),
    /// A unit that only builders and engineers speak.
    Unit(String),
}

/// Units that have a word everybody knows: short form, one of it, several of it.
const SPELLED: [(&str, &str, &str); 5] = [
    ("m", "metre", "metres"),
    ("mm", "millimetre", "millimetres"),
    ("m2", "square metre", "square metres"),
    ("m²", "square metre", "square metres"),
    ("kg", "kilogram", "kilograms"),
];

/// Units that have none.
const UNSPOKEN: [&str; 5] = ["kN", "kNm", "N", "kPa", "MPa"];

/// A text with the units after its numbers written out: `3.2 m span` as `3.2 metres span`.
pub fn spelled(text: &str) -> String {
    let words: Vec<&str> = text.split(' ').collect();
    let spell = |i: usize| {
        let (bare, stop) = split(words[i]);
        let count = i.checked_sub(1).map(|before| words[before]).filter(|before| number(before));
        match (count, SPELLED.iter().find(|(short, ..)| *short == bare)) {
            (Some("1"), Some((_, one, _))) => format!("{one}{stop}"),
            (Some(_), Some((.., all))) => format!("{all}{stop}"),
            _ => words[i].to_owned(),
        }
    };
    (0..words.len()).map(spell).collect::<Vec<_>>().join(" ")
}

/// A word and the punctuation after it.
fn split(word: &str) -> (&str, &str) {
    word.split_at(word.trim_end_matches([',', '.', ';', ':', '?', '!', ')']).len())
}

fn number(word: &str) -> bool {
    let word = word.trim_start_matches('(');
    word.starts_with(|c: char| c.is_ascii_digit()) && word.parse::<f64>().is_ok()
}

/// Sentences that are hard, each with why; the words between full stops, question marks and colons count as one.
pub fn hard(text: &str) -> Vec<(String, Hard)> {
    sentences(text).into_iter().filter_map(|s| why(&s).map(|why| (s, why))).collect()
}

fn why(sentence: &str) -> Option<Hard> {
    if let Some(sign) = sentence.chars().find(|c| !plain(*c)) {
        return Some(Hard::Sign(sign));
    }
    let all: Vec<&str> = sentence.split_whitespace().collect();
    let unit =
        all.windows(2).map(|w| (w[0], split(w[1]).0)).find(|(n, unit)| number(n) && UNSPOKEN.contains(unit));
    if let Some((_, unit)) = unit {
        return Some(Hard::Unit(unit.to_owned()));
    }
    let words = all.iter().filter(|w| w.chars().any(char::is_alphanumeric)).count();
    (words > WORDS).then_some(Hard::Long(words))
}

const fn plain(c: char) -> bool {
    c.is_ascii_alphanumeric()
        || matches!(
            c,
            ' ' | '.' | ',' | ':' | ';' | '?' | '!' | '-' | '\'' | '(' | ')' | '"' | 'é' | 'ö' | 'ü'
        )
}

/// A text in sentences. A full stop inside a number or an abbreviation of one letter ends none.
pub fn sentences(text: &str) -> Vec<String> {
    let mut out = vec![String::new()];
    let mut before = ' ';
    let mut signs = text.chars().peekable();
    while let Some(c) = signs.next() {
        if let Some(last) = out.last_mut() {
            last.push(c);
        }
        let initial = before.is_uppercase()
            && out
                .last()
                .is_some_and(|s| s.trim_end_matches('.').rsplit(' ').next().is_some_and(|w| w.len() == 1));
        if matches!(c, '.' | '?' | '!' | ':' | ';')
            && signs.peek().is_none_or(|n| n.is_whitespace())
            && !initial
        {
            out.push(String::new());
        }
        before = c;
    }
    out.into_iter().map(|s| s.trim().to_owned()).filter(|s| !s.is_empty()).collect()
}

#[cfg(test)]
mod tests {
    use super::{Hard, hard, sentences, spelled};

    #[test]
    fn sentences_end_where_they_end() {
        assert_eq!(
            sentences("It is 2.5 m long. J. Smith: sees it."),
            ["It is 2.5 m long.", "J. Smith:", "sees it."]
        );
    }

    #[test]
    fn long_sentences_and_signs_are_found() {
        let long = ["word"; 26].join(" ");
        assert_eq!(hard(&format!("Short one. {long}.")), [(format!("{long}."), Hard::Long(26))]);
        assert_eq!(hard("M ≤ N."), [("M ≤ N.".to_owned(), Hard::Sign('≤'))]);
        assert!(hard(&["word"; 25].join(" ")).is_empty());
        assert_eq!(hard("It bears 12 kN."), [("It bears 12 kN.".to_owned(), Hard::Unit("kN".to_owned()))]);
        assert!(hard("N walls and Mr N. Oake.").is_empty());
    }

    #[test]
    fn units_after_numbers_are_written_out() {
        assert_eq!(
            spelled("Joists, 3.2 m span, on 1 m of wall (100 mm). House 7, M Road, m and 20 m2."),
            "Joists, 3.2 metres span, on 1 metre of wall (100 millimetres). House 7, M Road, m and 20 square metres."
        );
    }
}
