//! New and changed objects appended to a PDF, whose bytes stay as they are.

use std::collections::BTreeMap;
use std::io::Write as _;

use flate2::Compression;
use flate2::write::ZlibEncoder;

use super::raw;

/// A PDF with objects appended. What stood before is its beginning, byte for byte.
pub struct Update {
    bytes: Vec<u8>,
    trailer: Vec<u8>,
    before: usize,
    next: u32,
    places: BTreeMap<u32, usize>,
}

impl Update {
    /// Begins an update of `pdf`; `None` where it does not end in a plain table of references, as this program writes it.
    pub fn of(pdf: &[u8]) -> Option<Self> {
        const START: &[u8] = b"startxref";
        let at = (0..pdf.len().saturating_sub(START.len())).rev().find(|at| pdf[*at..].starts_with(START))?;
        let place = std::str::from_utf8(&pdf[at + START.len()..]).ok()?.split_whitespace().next()?;
        let before: usize = place.parse().ok()?;
        let table = pdf.get(before..at)?;
        if !table.starts_with(b"xref") {
            return None;
        }
        let trailer = table.windows(7).rposition(|w| w == b"trailer").map(|n| table[n + 7..].trim_ascii())?;
        let next = number(raw::value(trailer, "Size")?)?;
        let mut bytes = pdf.to_vec();
        if !bytes.ends_with(b"\n") {
            bytes.push(b'\n');
        }
        Some(Self { bytes, trailer: trailer.to_vec(), before, next, places: BTreeMap::new() })
    }

    /// A number that no object has.
    pub fn fresh(&mut self) -> u32 {
        self.next += 1;
        self.next - 1
    }

    /// Writes an object; one of that number that was there is no longer read. Yields where its body begins.
    pub fn put(&mut self, id: u32, body: &[u8]) -> usize {
        self.places.insert(id, self.bytes.len());
        self.bytes.extend(format!("{id} 0 obj\n").as_bytes());
        let start = self.bytes.len();
        self.bytes.extend(body);
        self.bytes.extend(b"\nendobj\n");
        start
    }

    /// Writes a stream, compressed; `dict` its entries without brackets, length and filter.
    pub fn stream(&mut self, id: u32, dict: &str, content: &[u8]) -> Option<()> {
        let mut packer = ZlibEncoder::new(Vec::new(), Compression::default());
        packer.write_all(content).ok()?;
        let packed = packer.finish().ok()?;
        let head = format!("<<{dict}/Filter/FlateDecode/Length {}>>\nstream\n", packed.len());
        self.put(id, &[head.as_bytes(), &packed, b"\nendstream"].concat());
        Some(())
    }

    /// The whole file, closed by a table of what was written. `identity` is the second half of the file's identifier.
    pub fn closed(mut self, identity: &[u8]) -> Option<Vec<u8>> {
        let table = self.bytes.len();
        self.bytes.extend(b"xref\n");
        let mut run: Vec<(u32, usize)> = Vec::new();
        for (id, place) in std::mem::take(&mut self.places) {
            if run.last().is_some_and(|(last, _)| last + 1 != id) {
                self.rows(&std::mem::take(&mut run));
            }
            run.push((id, place));
        }
        self.rows(&run);
        let first = raw::value(&self.trailer, "ID").and_then(first_of)?;
        let second: String = identity.iter().map(|b| format!("{b:02X}")).collect();
        let id = [b"[", first, b"<", second.as_bytes(), b">]"].concat();
        let trailer = raw::with(&self.trailer, "Size", self.next.to_string())?;
        let trailer = raw::with(&trailer, "Prev", self.before.to_string())?;
        let trailer = raw::with(&trailer, "ID", &id)?;
        self.bytes.extend(b"trailer\n");
        self.bytes.extend(trailer);
        self.bytes.extend(format!("\nstartxref\n{table}\n%%EOF\n").as_bytes());
        Some(self.bytes)
    }

    fn rows(&mut self, run: &[(u32, usize)]) {
        if let Some((first, _)) = run.first() {
            self.bytes.extend(format!("{first} {}\n", run.len()).as_bytes());
        }
        for (_, place) in run {
            self.bytes.extend(format!("{place:010} 00000 n\r\n").as_bytes());
        }
    }
}

/// The first text of the array of identifiers, as it is written.
fn first_of(id: &[u8]) -> Option<&[u8]> {
    let start = id.iter().position(|b| *b == b'[')? + 1;
    let end = raw::object(id, start)?;
    id.get(start..end)
}

fn number(text: &[u8]) -> Option<u32> {
    std::str::from_utf8(text).ok()?.trim().parse().ok()
}
