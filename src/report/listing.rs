//! The job file as the pack lists it.

/// The lines of a job file with their numbers, without lines that are comments alone. An empty line
/// stays: it parts what stands before it from what follows.
///
/// A text over several lines may hold a line that looks like a comment; a file with such texts is
/// listed whole.
pub fn of(text: &str) -> Vec<(usize, String)> {
    let whole = text.contains("\"\"\"") || text.contains("'''");
    let comment = |line: &str| !whole && line.trim_start().starts_with('#');
    let lines = text.lines().enumerate().map(|(i, line)| (i + 1, line.to_owned()));
    lines.filter(|(_, line)| !comment(line)).collect()
}

#[cfg(test)]
mod tests {
    use super::of;

    #[test]
    fn comments_go_and_numbers_stay() {
        let text = "# head\n[job]\nnumber = \"1\" # first\n\n  # more\nx = \"#2\"\n";
        let kept: Vec<(usize, String)> = of(text);
        let says = [(2, "[job]"), (3, "number = \"1\" # first"), (4, ""), (6, "x = \"#2\"")];
        assert_eq!(kept, says.map(|(n, s)| (n, s.to_owned())));
    }

    #[test]
    fn a_file_with_long_texts_is_listed_whole() {
        let text = "# head\nx = \"\"\"\n# not a comment\n\"\"\"\n";
        assert_eq!(of(text).len(), 4);
    }
}
