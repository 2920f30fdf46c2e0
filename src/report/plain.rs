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
}

/// Sentences that are hard, each with why; the words between full stops, question marks and colons count as one.
pub fn hard(text: &str) -> Vec<(String, Hard)> {
    sentences(text).into_iter().filter_map(|s| why(&s).map(|why| (s, why))).collect()
}

fn why(sentence: &str) -> Option<Hard> {
    if let Some(sign) = sentence.chars().find(|c| !plain(*c)) {
        return Some(Hard::Sign(sign));
    }
    let words = sentence.split_whitespace().filter(|w| w.chars().any(char::is_alphanumeric)).count();
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
    use super::{Hard, hard, sentences};

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
    }
}
