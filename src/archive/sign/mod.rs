//! Packs signed with an engineer's own X.509 key, and what the signatures in a pack say.
//!
//! | part | what it holds |
//! |---|---|
//! | [`signer`](Signer) | a key and its certificate, from PEM or PKCS#12 |
//! | `key`, `public`, `hash`, `certificate`, `names` | what the crates for cryptography are asked, and nothing worked here |
//! | `cms` | the signature itself, RFC 5652 |
//! | `place` | where in the pack it is shown |
//! | `raw`, `update` | objects appended to a PDF, whose bytes stay as they are |
//! | `form`, `appearance` | fields, and the small print in the box |
//! | `found` | the signatures of a pack held against its bytes |
//!
//! The pack that is signed is the beginning of the signed file, byte for byte. The first signature adds a field for the
//! maker and one for the checker; the second only fills its own, so that the first stays whole.

mod appearance;
mod certificate;
mod cms;
mod form;
mod found;
mod hash;
mod key;
mod moment;
mod names;
mod place;
mod public;
mod raw;
mod signer;
mod update;

use std::fmt;

use hayro_syntax::Pdf;

pub use found::{Covers, Signature, State, signatures};
pub use moment::Moment;
pub use signer::{Passphrase, Signer};

use hash::Hash;
use update::Update;

/// As what somebody signs.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord)]
pub enum Role {
    /// Who made the calculations.
    Made,
    /// Who checked them.
    Checked,
}

impl Role {
    /// Both, in the order of the sign-off.
    pub const ALL: [Self; 2] = [Self::Made, Self::Checked];

    /// As the sign-off has it.
    pub const fn words(self) -> &'static str {
        match self {
            Self::Made => "made by",
            Self::Checked => "checked by",
        }
    }

    /// The name of its field.
    const fn field(self) -> &'static str {
        match self {
            Self::Made => "made",
            Self::Checked => "checked",
        }
    }

    /// What the name of a signed file ends with.
    pub const fn ending(self) -> &'static str {
        match self {
            Self::Made => "signed",
            Self::Checked => "checked",
        }
    }
}

/// Which of the files is at fault.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Fault {
    /// The pack.
    Pack,
    /// The file with the key.
    Key,
    /// The certificate: its own file, or the key's where it has none.
    Certificate,
}

/// Why nothing was signed.
#[derive(Clone, Debug, PartialEq, Eq)]
pub struct Refused {
    /// The file at fault.
    pub fault: Fault,
    /// What is wrong with it.
    pub what: String,
    /// What to do, a whole sentence.
    pub help: &'static str,
}

impl fmt::Display for Refused {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        f.write_str(&self.what)
    }
}

impl Refused {
    fn pack(what: impl Into<String>, help: &'static str) -> Self {
        Self { fault: Fault::Pack, what: what.into(), help }
    }

    /// The file with the key is at fault.
    pub fn key(what: impl Into<String>, help: &'static str) -> Self {
        Self { fault: Fault::Key, what: what.into(), help }
    }

    fn certificate(what: impl Into<String>, help: &'static str) -> Self {
        Self { fault: Fault::Certificate, what: what.into(), help }
    }
}

/// What to do about a pack whose form is not that of this program.
const FRESH: &str =
    "Sign the pack as `perpend sheet` of this version writes it, and no other program saved it.";

/// The signed file: the bytes of `pack`, and behind them the signature of `signer`, given at that moment.
///
/// # Errors
/// [`Refused`] where it is no pack, has no place to sign or is signed in that role, where an earlier signature is broken,
/// or where the certificate is not in force.
pub fn sign(pack: &[u8], signer: &Signer, role: Role, at: Moment) -> Result<Vec<u8>, Refused> {
    super::held(pack.to_vec()).map_err(|unfit| Refused::pack(unfit.to_string(), unfit.help()))?;
    signer.in_force(at)?;
    let there = signatures(pack);
    if let Some(one) = there.iter().find(|s| s.role == Some(role)) {
        return Err(Refused::pack(
            format!("it is signed already, {} {}", role.words(), one.subject),
            "Sign in the other role with --as, or sign the pack that is not signed yet.",
        ));
    }
    if !there.iter().all(Signature::holds) {
        return Err(Refused::pack(
            "a signature that is in it does not hold",
            "See what `perpend recheck` says of it, and sign a whole copy.",
        ));
    }
    let no_place = || Refused::pack(format!("it has no place where to sign, {}", role.words()), FRESH);
    let pdf = Pdf::new(pack.to_vec()).map_err(|_| no_place())?;
    let mut update = Update::of(pack).ok_or_else(no_place)?;
    let signature = update.fresh();
    let shown = form::Shown { signer, at, signature };
    form::fill(&pdf, &mut update, role, &shown).ok_or_else(no_place)?;
    let size = room(signer);
    let start = update.put(signature, dictionary(signer, role, at, size).as_bytes());
    let identity =
        Hash::Sha256.of(&[pack, role.words().as_bytes(), at.pdf().as_bytes(), &form::identity(signer)]);
    let mut bytes = update.closed(&identity[..16]).ok_or_else(no_place)?;
    close(&mut bytes, start, size, signer).ok_or_else(|| {
        Refused::key("its key made no signature", "Try the key with another program; nothing was written.")
    })?;
    Ok(bytes)
}

/// Bytes that are kept for the signature: its certificates, and enough for the rest.
fn room(signer: &Signer) -> usize {
    const REST: usize = 2048;
    form::certificates(signer) + REST
}

const RANGE: &str = "/ByteRange[";
const CONTENTS: &str = "/Contents<";
/// Digits of a place in a file.
const DIGITS: usize = 10;

/// The signature's dictionary with noughts for what is known only when the file is whole.
fn dictionary(signer: &Signer, role: Role, at: Moment, size: usize) -> String {
    let blank = " ".repeat(DIGITS);
    format!(
        "<</Type/Sig/Filter/Adobe.PPKLite/SubFilter/ETSI.CAdES.detached/M({})/Name{}/Reason{}{RANGE}0 {blank} {blank} {blank}]{CONTENTS}{}>>>",
        at.pdf(),
        raw::words(&signer.name()),
        raw::words(role.words()),
        "0".repeat(2 * size),
    )
}

/// Writes the ranges and the signature into the dictionary that begins at `start`.
fn close(bytes: &mut [u8], start: usize, size: usize, signer: &Signer) -> Option<()> {
    let place = |bytes: &[u8], words: &str| {
        let inside = bytes[start..].windows(words.len()).position(|w| w == words.as_bytes())?;
        Some(start + inside + words.len())
    };
    let hex = place(bytes, CONTENTS)?;
    // Brackets of the text are left out of what is signed with it.
    let (gap, after) = (hex - 1, hex + 2 * size + 1);
    let ranges = format!("0 {gap:<DIGITS$} {after:<DIGITS$} {:<DIGITS$}", bytes.len() - after);
    let range = place(bytes, RANGE)?;
    bytes[range..range + ranges.len()].copy_from_slice(ranges.as_bytes());
    let digest = signer.key.hash().of(&[&bytes[..gap], &bytes[after..]]);
    let cms = cms::make(&digest, signer)?;
    let text: String = cms.iter().map(|b| format!("{b:02x}")).collect();
    bytes.get_mut(hex..after - 1)?.get_mut(..text.len())?.copy_from_slice(text.as_bytes());
    Some(())
}
