//! Lines of a job file or practice file named by the tables in which they stand.

use std::ops::Range;

use toml::de::{DeTable, DeValue};

/// Keys whose value names the table that holds them, the first of these that it has.
const NAMES: [&str; 3] = ["mark", "name", "letter"];

/// For each line the table of its entry, as `returns R2`, empty for an entry of the file itself; nothing for remarks,
/// empty lines, and everything where the text is not TOML.
pub fn of_lines(text: &str) -> Vec<Option<String>> {
    let mut out = vec![None; text.lines().count()];
    let Ok(tree) = DeTable::parse(text) else { return out };
    let mut found = Vec::new();
    walk(text, tree.get_ref(), "", &mut found);
    // Lines from place to place, each counted once.
    let ends: Vec<usize> = text.match_indices('\n').map(|(at, _)| at).collect();
    let line = |at: usize| ends.partition_point(|end| *end < at);
    for (span, table) in found {
        let last = line(span.end.saturating_sub(1).max(span.start));
        for one in out.iter_mut().take(last + 1).skip(line(span.start)) {
            *one = Some(table.clone());
        }
    }
    out
}

/// Places of the entries below a table, and of the heads of tables in it, with the name of the table each belongs to.
fn walk(text: &str, table: &DeTable<'_>, name: &str, found: &mut Vec<(Range<usize>, String)>) {
    // A table stands under a head, its own or that of a table in it; one written in a line, or by a dotted key, does not.
    let headed = |span: Range<usize>| {
        let line = text[..span.start].rfind('\n').map_or(0, |end| end + 1);
        text[line..].trim_start().starts_with('[')
    };
    for (key, value) in table {
        let key_at = key.span().start;
        let (inner, several): (Vec<_>, bool) = match value.get_ref() {
            DeValue::Table(table) => (vec![(table, value.span())], false),
            DeValue::Array(items) => {
                (items.iter().filter_map(|i| Some((i.get_ref().as_table()?, i.span()))).collect(), true)
            }
            _ => (Vec::new(), false),
        };
        if inner.is_empty() || !inner.iter().all(|(_, span)| headed(span.clone())) {
            found.push((key_at..value.span().end, name.to_owned()));
            // Dotted keys of one table may stand on many lines.
            inner.iter().for_each(|(table, _)| walk(text, table, name, found));
            continue;
        }
        for (table, head) in inner {
            let below = [name, key.get_ref()].join(" ").trim().to_owned();
            let named = if several { titled(table, &below) } else { below };
            found.push((head, named.clone()));
            walk(text, table, &named, found);
        }
    }
}

/// The name of one table of several with the mark by which people know it.
fn titled(table: &DeTable<'_>, name: &str) -> String {
    let own = NAMES.iter().find_map(|key| table.get(*key)?.get_ref().as_str());
    [name, own.unwrap_or_default()].join(" ").trim().to_owned()
}

#[cfg(test)]
mod tests {
    use super::*;

    const TEXT: &str = "a = 1\nlist = [\n  { y = 1 },\n  { y = 2 },\n]\n\n# Remark.\n[one]\nb.c = 2\n\n[one.two]\nc = 3\n\n\
        [[returns]]\nlength = 5\nmark = \"R1\"\n\n[[returns]]\nmark = \"R2\"\n\n[[returns.loads]]\nname = \"beam\"\nd = { e = 3 }\n\
        [over.under]\nf = 4\n";

    #[test]
    fn each_line_is_named_by_its_table() {
        let wanted = [
            // Five lines of the file itself, an empty one and a remark.
            "/////-/-",
            "/one/one/-/one two/one two/-/returns R1/returns R1/returns R1/-",
            "/returns R2/returns R2/-/returns R2 loads beam/returns R2 loads beam/returns R2 loads beam",
            "/over under/over under",
        ];
        let shown: Vec<String> = of_lines(TEXT).into_iter().map(|t| t.unwrap_or("-".to_owned())).collect();
        assert_eq!(shown.join("/"), wanted.concat());
        assert_eq!(of_lines("no TOML\nat all"), [None, None]);
    }
}
