//! Fields for signatures: put into a pack once, both of them, and filled one at a time.

use std::collections::BTreeMap;

use der::Encode as _;
use hayro_syntax::Pdf;
use hayro_syntax::object::{Array, Dict, ObjectIdentifier, String as Text};

use super::appearance;
use super::certificate::name;
use super::hash::Hash;
use super::moment::Moment;
use super::place::{self, Place};
use super::signer::Signer;
use super::update::Update;
use super::{Role, raw};
use crate::archive::pdf::words;

/// What a field shows, and the number of its signature.
pub struct Shown<'a> {
    pub signer: &'a Signer,
    pub at: Moment,
    pub signature: u32,
}

/// Bytes of all certificates.
pub fn certificates(signer: &Signer) -> usize {
    signer.certificates.iter().map(|c| c.to_der().map_or(0, |der| der.len())).sum()
}

/// The digest of the signer's certificate.
pub fn identity(signer: &Signer) -> Vec<u8> {
    Hash::Sha256.of(&[&signer.certificates[0].to_der().unwrap_or_default()])
}

/// The signature fields of a PDF, as the catalogue lists them.
pub fn fields(pdf: &Pdf) -> Vec<Dict<'_>> {
    let xref = pdf.xref();
    let listed = || {
        let catalogue = xref.get::<Dict<'_>>(xref.root_id())?;
        let fields = catalogue.get::<Dict<'_>>("AcroForm")?.get::<Array<'_>>("Fields")?;
        Some(fields.iter::<Dict<'_>>().filter(is_signature).collect())
    };
    listed().unwrap_or_default()
}

/// Whether a dictionary is a field for a signature.
pub fn is_signature(d: &Dict<'_>) -> bool {
    d.get::<hayro_syntax::object::Name<'_>>("FT").is_some_and(|t| t.as_str() == "Sig")
}

/// The role of a field; `None` where it is not one of ours.
pub fn role(field: &Dict<'_>) -> Option<Role> {
    let title = field.get::<Text<'_>>("T").map(|t| words(t.as_bytes()))?;
    Role::ALL.into_iter().find(|role| role.field() == title)
}

/// Fills the field of a role, and puts both fields there first where the pack has none. `None` where the pack is not built
/// as this program builds it.
pub fn fill(pdf: &Pdf, update: &mut Update, of: Role, shown: &Shown<'_>) -> Option<()> {
    let there = fields(pdf);
    if there.is_empty() {
        let xref = pdf.xref();
        // A form of another program stays as it is.
        if xref.get::<Dict<'_>>(xref.root_id())?.contains_key("AcroForm") {
            return None;
        }
        return put(pdf, update, of, shown);
    }
    let field = there.iter().find(|f| role(f) == Some(of))?;
    let rect = field.get::<Array<'_>>("Rect")?.iter::<f32>().collect::<Vec<_>>();
    let drawing = draw(update, &<[f32; 4]>::try_from(rect).ok()?, &lines(shown))?;
    let body = filled(field.data(), drawing, shown.signature)?;
    update.put(number(field.obj_id()?)?, &body);
    Some(())
}

fn filled(field: &[u8], drawing: u32, signature: u32) -> Option<Vec<u8>> {
    let field = raw::with(field, "AP", format!("<</N {drawing} 0 R>>"))?;
    raw::with(&field, "V", format!("{signature} 0 R"))
}

/// What stands in the box.
fn lines(shown: &Shown<'_>) -> Vec<String> {
    let certificate = &shown.signer.certificates[0].tbs_certificate;
    vec![
        // The date first: a long name is cut at the end of the line.
        format!("Digitally signed {}: {}", shown.at.words(), shown.signer.name()),
        format!("certificate of {}", name(&certificate.subject)),
        format!("issued by {}", name(&certificate.issuer)),
    ]
}

/// Draws lines for a box. Yields the number of the drawing.
fn draw(update: &mut Update, rect: &[f32; 4], lines: &[String]) -> Option<u32> {
    let (width, height) = (rect[2] - rect[0], rect[3] - rect[1]);
    let id = update.fresh();
    let dict = format!("/Type/XObject/Subtype/Form/BBox[0 0 {width} {height}]/Resources<<>>");
    update.stream(id, &dict, &appearance::content(lines, width))?;
    Some(id)
}

/// Objects that are changed, as they will be written.
struct Changed<'a> {
    pdf: &'a Pdf,
    bodies: BTreeMap<u32, Vec<u8>>,
}

impl Changed<'_> {
    /// Sets one entry of an object to what `make` makes of it.
    fn set(
        &mut self,
        of: ObjectIdentifier,
        key: &str,
        make: impl FnOnce(Option<&[u8]>) -> Option<Vec<u8>>,
    ) -> Option<()> {
        let id = number(of)?;
        let body = match self.bodies.remove(&id) {
            Some(body) => body,
            None => self.pdf.xref().get::<Dict<'_>>(of)?.data().to_vec(),
        };
        let value = make(raw::value(&body, key).map(<[u8]>::trim_ascii))?;
        self.bodies.insert(id, raw::with(&body, key, value)?);
        Some(())
    }
}

/// Puts both fields into a pack that has none, with what lets a screen reader find them.
fn put(pdf: &Pdf, update: &mut Update, of: Role, shown: &Shown<'_>) -> Option<()> {
    let xref = pdf.xref();
    let root = xref.get::<Dict<'_>>(xref.root_id())?;
    let tree = ObjectIdentifier::from(root.get_ref("StructTreeRoot")?);
    let mut next_key = xref.get::<Dict<'_>>(tree)?.get::<i32>("ParentTreeNextKey")?;
    let mut changed = Changed { pdf, bodies: BTreeMap::new() };
    let mut all = Vec::new();
    for role in Role::ALL {
        let place = place::find(pdf, role)?;
        let (field, element) = (update.fresh(), update.fresh());
        let written = lines(shown);
        let drawing = draw(update, &place.rect, if role == of { &written } else { &[] })?;
        let body = widget(&place, role, next_key, drawing)?;
        let body = if role == of { filled(&body, drawing, shown.signature)? } else { body };
        update.put(field, &body);
        update.put(element, structure(&place, role, field)?.as_bytes());
        let reference = format!("{field} 0 R");
        changed.set(place.page, "Annots", |there| match there {
            None => Some(format!("[{reference}]").into_bytes()),
            Some(array) => raw::pushed(array, None, &reference),
        })?;
        let after = format!("{} 0 R", number(place.figure)?);
        changed.set(place.parent, "K", |kids| raw::pushed(kids?, Some(&after), &format!("{element} 0 R")))?;
        changed.set(tree, "ParentTree", |parents| {
            let numbers = raw::pushed(
                raw::value(parents?, "Nums")?.trim_ascii(),
                None,
                &format!("{next_key} {element} 0 R"),
            );
            raw::with(parents?, "Nums", numbers?)
        })?;
        next_key += 1;
        all.push(reference);
    }
    changed.set(tree, "ParentTreeNextKey", |_| Some(next_key.to_string().into_bytes()))?;
    // Flag 1: there are signatures; flag 2: a program that saves the file must append to it.
    let form = format!("<</Fields[{}]/SigFlags 3>>", all.join(" "));
    changed.set(xref.root_id(), "AcroForm", |_| Some(form.into_bytes()))?;
    for (id, body) in changed.bodies {
        update.put(id, &body);
    }
    Some(())
}

/// A field and its widget in one, empty. Flag 4: it is printed.
fn widget(place: &Place, role: Role, key: i32, drawing: u32) -> Option<Vec<u8>> {
    let [left, foot, right, top] = place.rect;
    let page = number(place.page)?;
    Some(
        format!(
            "<</Type/Annot/Subtype/Widget/FT/Sig/T{}/TU{}/F 4/Rect[{left} {foot} {right} {top}]/P {page} 0 R\
             /StructParent {key}/AP<</N {drawing} 0 R>>>>",
            raw::words(role.field()),
            raw::words(&format!("Signature: {}", role.words())),
        )
        .into_bytes(),
    )
}

/// The part of the structure that is the field.
fn structure(place: &Place, role: Role, field: u32) -> Option<String> {
    let (parent, page) = (number(place.parent)?, number(place.page)?);
    let alt = raw::words(&format!("Digital signature: {}", role.words()));
    Some(format!(
        "<</Type/StructElem/S/Form/P {parent} 0 R/Pg {page} 0 R/Alt{alt}/K<</Type/OBJR/Obj {field} 0 R/Pg {page} 0 R>>>>"
    ))
}

/// The number of an object that may be written again: one of the first generation, as this program writes.
fn number(id: ObjectIdentifier) -> Option<u32> {
    u32::try_from(id.obj_number).ok().filter(|_| id.gen_number == 0)
}
