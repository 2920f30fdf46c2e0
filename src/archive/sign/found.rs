//! The signatures of a pack, held against its bytes.

use hayro_syntax::Pdf;
use hayro_syntax::object::{Array, Dict, Object, ObjectIdentifier, String as Text};

use super::certificate::name;
use super::moment::Moment;
use super::{Role, cms, form, raw};
use crate::archive::pdf::words;

/// How much of the file a signature covers.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Covers {
    /// All of it.
    All,
    /// All that was there when it was given; what was added since is another signature and nothing else.
    UpToNext,
    /// All that was there when it was given; the file was changed since.
    Changed,
}

/// What holding a signature against the file showed.
#[derive(Clone, Debug, PartialEq, Eq)]
pub enum State {
    /// The bytes are those that were signed, and the certificate's key signed them.
    Whole(Covers),
    /// They are not, or it did not; in words.
    Broken(&'static str),
    /// This program cannot tell; why.
    Unknown(&'static str),
}

/// One signature.
#[derive(Clone, Debug, PartialEq, Eq)]
pub struct Signature {
    /// As what; `None` where another program made its field.
    pub role: Option<Role>,
    /// Subject of the certificate; empty where there is none that reads.
    pub subject: String,
    /// Issuer of the certificate.
    pub issuer: String,
    /// When, by its own claim; `None` where it claims nothing.
    pub claimed: Option<Moment>,
    /// Whether the certificate was in force then.
    pub in_force: bool,
    /// What it is worth.
    pub state: State,
}

impl Signature {
    /// Whether everything about it that can be told here is as it should be.
    pub const fn holds(&self) -> bool {
        matches!(self.state, State::Whole(Covers::All | Covers::UpToNext)) && self.in_force
    }

    /// In one line.
    pub fn words(&self) -> String {
        let role = self.role.map_or("signed by", Role::words);
        let who = match self.subject.is_empty() {
            true => "nobody that can be read".to_owned(),
            false => format!("{} (issued by {})", self.subject, self.issuer),
        };
        let when = self
            .claimed
            .map_or("at no said time".to_owned(), |at| format!("on {} by its own claim", at.words()));
        let state = match self.state {
            State::Whole(Covers::All) => "whole, and covers the whole file".to_owned(),
            State::Whole(Covers::UpToNext) => {
                "whole, and nothing but a later signature was added to what it covers".to_owned()
            }
            State::Whole(Covers::Changed) => "NOT whole: the file was changed after it was given".to_owned(),
            State::Broken(why) => format!("BROKEN: {why}"),
            State::Unknown(why) => format!("NOT verified: {why}"),
        };
        let force = if self.in_force || self.subject.is_empty() {
            ""
        } else {
            "; its certificate was NOT in force then"
        };
        format!("digital signature, {role} {who}, {when}: {state}{force}")
    }
}

/// Every signature of a PDF, in the order of its fields; none where it is no PDF.
pub fn signatures(bytes: &[u8]) -> Vec<Signature> {
    let Ok(pdf) = Pdf::new(bytes.to_vec()) else { return Vec::new() };
    let fields = form::fields(&pdf);
    let signed = fields.iter().filter_map(|field| Some((form::role(field), field.get::<Dict<'_>>("V")?)));
    let mut out: Vec<Signature> = signed.map(|(role, value)| one(bytes, &pdf, role, &value)).collect();
    // What was added last must be a signature that holds: else nobody vouches for the end of the file.
    if !out.iter().any(|s| s.state == State::Whole(Covers::All)) {
        for s in &mut out {
            if s.state == State::Whole(Covers::UpToNext) {
                s.state = State::Whole(Covers::Changed);
            }
        }
    }
    out
}

fn one(bytes: &[u8], pdf: &Pdf, role: Option<Role>, value: &Dict<'_>) -> Signature {
    let text = |key: &str| value.get::<Text<'_>>(key).map(|t| words(t.as_bytes()));
    let mut out = Signature {
        role,
        subject: String::new(),
        issuer: String::new(),
        claimed: text("M").as_deref().and_then(Moment::from_pdf),
        in_force: false,
        state: State::Broken("its dictionary does not say which bytes it covers"),
    };
    let Some((first, second, end)) = covered(bytes, value) else { return out };
    let contents = value.get::<Text<'_>>("Contents").map(|c| c.as_bytes().to_vec()).unwrap_or_default();
    let Some(read) = cms::read(&contents, &[first, second]) else {
        out.state = State::Unknown("it is of a form that this program does not read");
        return out;
    };
    let certificate = &read.certificate.tbs_certificate;
    out.subject = name(&certificate.subject);
    out.issuer = name(&certificate.issuer);
    let force = certificate.validity.not_before.to_unix_duration()
        ..=certificate.validity.not_after.to_unix_duration();
    out.in_force = out.claimed.is_some_and(|at| force.contains(&at.since_1970()));
    out.state = match (read.same, read.made_by_key) {
        (false, _) => State::Broken("the file is not the one that was signed"),
        (true, Some(false)) => State::Broken("it was not made with the key of its certificate"),
        (true, None) => State::Unknown("its key is of a kind that this program does not know"),
        (true, Some(true)) => State::Whole(covers(bytes, pdf, end)),
    };
    out
}

/// What a signature says that it covers: everything from the beginning but its own text, in two
/// pieces, and where that ends. `None` where it says otherwise.
fn covered<'a>(bytes: &'a [u8], value: &Dict<'_>) -> Option<(&'a [u8], &'a [u8], usize)> {
    let ranges: Vec<i32> = value.get::<Array<'_>>("ByteRange")?.iter::<i32>().collect();
    let ranges: Option<Vec<usize>> = ranges.iter().map(|n| usize::try_from(*n).ok()).collect();
    let [0, gap, after, length] = ranges?[..] else { return None };
    let end = after.checked_add(length)?;
    let (first, hole, second) = (bytes.get(..gap)?, bytes.get(gap..after)?, bytes.get(after..end)?);
    // The hole is the signature and no more: anything else in it would be a place to hide.
    let hex = std::str::from_utf8(hole.strip_prefix(b"<")?.strip_suffix(b">")?).ok()?;
    let own: String =
        value.get::<Text<'_>>("Contents")?.as_bytes().iter().map(|b| format!("{b:02x}")).collect();
    hex.eq_ignore_ascii_case(&own).then_some((first, second, end))
}

/// What was added behind the first `end` bytes.
fn covers(bytes: &[u8], now: &Pdf, end: usize) -> Covers {
    if end == bytes.len() {
        return Covers::All;
    }
    let Ok(was) = Pdf::new(bytes[..end].to_vec()) else { return Covers::Changed };
    if was.xref().root_id() != now.xref().root_id() {
        return Covers::Changed;
    }
    let most = i32::try_from(was.len()).unwrap_or(i32::MAX);
    let same = |n: i32| {
        let id = ObjectIdentifier::new(n, 0);
        let (old, new) = (was.xref().get::<Object<'_>>(id), now.xref().get::<Object<'_>>(id));
        old == new
            || matches!((old, new), (Some(Object::Dict(old)), Some(Object::Dict(new))) if only_filled(&old, &new))
    };
    if (0..=most).all(same) { Covers::UpToNext } else { Covers::Changed }
}

/// Whether all that happened to an empty field is that it was signed.
fn only_filled(old: &Dict<'_>, new: &Dict<'_>) -> bool {
    let emptied = |d: &Dict<'_>| raw::with(&raw::with(d.data(), "AP", "0")?, "V", "0");
    let (was, is) = (emptied(old), emptied(new));
    let signed = !old.contains_key("V") && new.contains_key("V");
    form::is_signature(old) && signed && was.is_some() && was == is
}
