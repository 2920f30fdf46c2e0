//! Packs signed, and their signatures held against their bytes.

pub mod keys;
mod refused;

use std::path::Path;
use std::sync::OnceLock;

use hayro_syntax::Pdf;
use hayro_syntax::object::{Array, Dict, MaybeRef, Name, Object, ObjectIdentifier, Stream};
use perpend::archive::held;
use perpend::archive::sign::{
    Covers, Moment, Passphrase, Refused, Role, Signature, Signer, State, sign, signatures,
};
use perpend::sheet;

use crate::examples::job::{BLOCK_140, PLAIN_RETURN, with_return};

/// The pack of a plain job.
pub fn pack() -> &'static [u8] {
    static PACK: OnceLock<Vec<u8>> = OnceLock::new();
    PACK.get_or_init(|| {
        sheet("job.toml", &with_return(BLOCK_140, PLAIN_RETURN), Path::new("")).expect("a pack").typeset.pdf
    })
}

/// A signer from a file, with the passphrase of the tests.
pub fn signer(file: &[u8]) -> Result<Signer, Refused> {
    Signer::open(file, None, &mut || Ok(Passphrase::new(keys::PASSPHRASE.to_owned())))
}

/// A moment inside the validity of the certificates.
pub fn noon() -> Moment {
    Moment::read("2026-12-02T12:00:00Z").expect("a moment")
}

fn signed(pack: &[u8], file: &[u8], role: Role) -> Vec<u8> {
    sign(pack, &signer(file).expect("a signer"), role, noon()).expect("a signed pack")
}

fn states(pdf: &[u8]) -> Vec<(Option<Role>, State)> {
    signatures(pdf).into_iter().map(|s| (s.role, s.state)).collect()
}

#[test]
fn every_kind_of_key_signs_and_is_verified() {
    let files: [(&str, Vec<u8>); 5] = [
        ("open PEM", keys::open_pem("R. Hollin", 7).into_bytes()),
        ("locked PEM", keys::locked_pem("R. Hollin", 7).into_bytes()),
        ("PKCS#12", keys::pkcs12("R. Hollin", 7)),
        ("RSA", keys::rsa_pem("R. Hollin").into_bytes()),
        ("P-384", keys::p384_pem("R. Hollin").into_bytes()),
    ];
    for (kind, file) in files {
        let pdf = signed(pack(), &file, Role::Made);
        assert!(pdf.starts_with(pack()), "{kind}: the pack is the beginning of the signed file");
        assert_eq!(states(&pdf), [(Some(Role::Made), State::Whole(Covers::All))], "{kind}");
        let one = &signatures(&pdf)[0];
        assert!(one.holds() && one.subject == "CN=R. Hollin,O=Test keys,C=GB", "{kind}: {one:?}");
        assert_eq!(
            (one.issuer.as_str(), one.claimed),
            ("CN=Test issuer,O=Test keys,C=GB", Some(noon())),
            "{kind}"
        );
        // Key, date and pack are the same: so is every byte.
        assert!(pdf == signed(pack(), &file, Role::Made), "{kind}: other bytes");
        let (inside, was) = (held(pdf).expect("a pack"), held(pack().to_vec()).expect("a pack"));
        assert_eq!((inside.job, inside.record), (was.job, was.record), "{kind}");
    }
}

#[test]
fn the_checker_signs_behind_the_maker() {
    let (made, checked) = (keys::open_pem("R. Hollin", 7), keys::rsa_pem("T. Varley"));
    let first = signed(pack(), made.as_bytes(), Role::Made);
    let both = signed(&first, checked.as_bytes(), Role::Checked);
    assert!(both.starts_with(&first));
    let wanted = [
        (Some(Role::Made), State::Whole(Covers::UpToNext)),
        (Some(Role::Checked), State::Whole(Covers::All)),
    ];
    assert_eq!(states(&both), wanted);
    assert!(signatures(&both).iter().all(Signature::holds));
    // The other way round.
    let first = signed(pack(), checked.as_bytes(), Role::Checked);
    assert_eq!(states(&first), [(Some(Role::Checked), State::Whole(Covers::All))]);
    let both = signed(&first, made.as_bytes(), Role::Made);
    assert!(signatures(&both).len() == 2 && signatures(&both).iter().all(Signature::holds));
}

/// A byte of the pack, of the dictionary, of the certificate and of the signature.
#[test]
fn one_byte_breaks_it() {
    let pdf = signed(pack(), keys::open_pem("R. Hollin", 7).as_bytes(), Role::Made);
    let find =
        |words: &str| pdf.windows(words.len()).rposition(|w| w == words.as_bytes()).expect("it is there");
    let day = find("/M(D:20261202") + 12;
    let contents = find("/Contents<") + "/Contents<".len();
    // Inside the first stream, in a comment of the header, in the date.
    for (at, to) in [(20, b'x'), (pack().len() / 2, pdf[pack().len() / 2] ^ 1), (day, b'3')] {
        let mut other = pdf.clone();
        other[at] = to;
        for s in signatures(&other) {
            assert_eq!(s.state, State::Broken("the file is not the one that was signed"), "byte {at}");
            assert!(!s.holds() && s.words().contains("BROKEN"), "{}", s.words());
        }
    }
    assert_eq!(signatures(&pdf).len(), 1);
    // The signature itself: its last bytes are those of ECDSA, before the noughts.
    let last = pdf[contents..].iter().position(|b| *b == b'>').expect("an end") + contents;
    let last = pdf[..last].iter().rposition(|b| *b != b'0').expect("a digit");
    let mut other = pdf.clone();
    other[last - 2] = if other[last - 2] == b'1' { b'2' } else { b'1' };
    let state = signatures(&other).remove(0).state;
    assert_eq!(state, State::Broken("it was not made with the key of its certificate"));
}

/// What is added behind a signature is told, unless it is another signature and nothing else.
#[test]
fn what_is_added_later_is_told() {
    let pdf = signed(pack(), keys::open_pem("R. Hollin", 7).as_bytes(), Role::Made);
    let mut more = pdf.clone();
    more.extend(b"% a remark\n");
    assert_eq!(
        states(&more),
        [(Some(Role::Made), State::Whole(Covers::Changed))],
        "nobody vouches for the end of the file"
    );
    // A page that takes the place of the first, as an editor appends it.
    let reader = Pdf::new(pdf.clone()).expect("a PDF");
    let mut dicts = reader.objects().into_iter().filter_map(Object::into_dict);
    let page = dicts.find(|d| d.get::<Name<'_>>("Type").is_some_and(|t| t.as_str() == "Page"));
    let page = page.and_then(|p| p.obj_id()).expect("a page").obj_number;
    let size = reader.len() + 1;
    let root = reader.xref().root_id().obj_number;
    let text = String::from_utf8_lossy(&pdf[pdf.len() - 40..]).into_owned();
    let before: usize = text
        .split("startxref")
        .nth(1)
        .and_then(|t| t.split_whitespace().next()?.parse().ok())
        .expect("a place");
    let mut more = pdf.clone();
    let at = more.len();
    more.extend(format!("{page} 0 obj\n<</Type/Page/Parent 1 0 R/MediaBox[0 0 9 9]>>\nendobj\n").as_bytes());
    let table = more.len();
    more.extend(
        format!(
            "xref\n{page} 1\n{at:010} 00000 n\r\ntrailer\n<</Size {size}/Root {root} 0 R/Prev {before}>>\nstartxref\n{table}\n%%EOF\n"
        )
        .as_bytes(),
    );
    assert_eq!(states(&more), [(Some(Role::Made), State::Whole(Covers::Changed))]);
    assert!(!signatures(&more)[0].holds());
}

/// The box of the sign-off: a field on a page, printed, with an appearance, in the structure of the document.
#[test]
fn the_field_is_seen_printed_and_spoken() {
    let pdf = signed(pack(), keys::open_pem("R. Hollin", 7).as_bytes(), Role::Made);
    let reader = Pdf::new(pdf).expect("a PDF");
    let of = |key: &str, value: &str| -> Vec<Dict<'_>> {
        let dicts = reader.objects().into_iter().filter_map(Object::into_dict);
        dicts.filter(|d| d.get::<Name<'_>>(key).is_some_and(|n| n.as_str() == value)).collect()
    };
    let fields = of("FT", "Sig");
    let forms = of("S", "Form");
    assert_eq!((fields.len(), forms.len()), (2, 2));
    let mut signed = 0;
    for field in &fields {
        assert_eq!(field.get::<i32>("F"), Some(4), "it is printed");
        assert!(field.contains_key("TU") && field.contains_key("StructParent"));
        signed += usize::from(field.contains_key("V"));
        let rect: Vec<f32> = field.get::<Array<'_>>("Rect").expect("a place").iter::<f32>().collect();
        // Three lines of small print, and as wide as the sign-off leaves it.
        assert!(rect[2] - rect[0] > 200.0 && (25.0..35.0).contains(&(rect[3] - rect[1])), "{rect:?}");
        let drawing = field.get::<Dict<'_>>("AP").and_then(|ap| ap.get::<Stream<'_>>("N"));
        let ink = drawing.expect("an appearance").decoded().expect("it unpacks").len();
        assert_eq!(ink > 1000, field.contains_key("V"), "{ink} bytes");
        let page = field.get::<Dict<'_>>("P").expect("a page");
        let listed = page.get::<Array<'_>>("Annots").expect("annotations");
        // By number: a reader that is asked for the field from inside the field would run in a circle.
        let same = |a: MaybeRef<Object<'_>>| a.as_obj_ref().map(ObjectIdentifier::from) == field.obj_id();
        assert!(listed.raw_iter().any(same), "{:?}", String::from_utf8_lossy(page.data()));
        assert!(page.get::<Name<'_>>("Tabs").is_some_and(|t| t.as_str() == "S"));
        let spoken = forms.iter().filter(|f| {
            f.get::<Dict<'_>>("K").and_then(|k| k.get::<Dict<'_>>("Obj")).and_then(|o| o.obj_id())
                == field.obj_id()
        });
        assert_eq!(spoken.count(), 1);
    }
    assert_eq!(signed, 1);
}
