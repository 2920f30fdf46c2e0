//! Certificates: read whole or not at all, and their names in words.

use der::{Decode as _, Encode as _};
use x509_cert::Certificate;
use x509_cert::name::Name;

/// A certificate from DER. One that would be written with other bytes than it has is none: signatures are over bytes.
pub fn read(bytes: &[u8]) -> Option<Certificate> {
    let found = Certificate::from_der(bytes).ok()?;
    (found.to_der().ok()?.as_slice() == bytes).then_some(found)
}

/// A name in one line, the most particular part first: `CN=R. Hollin,O=Hollin Structures,C=GB`.
pub fn name(name: &Name) -> String {
    // Control characters of a foreign certificate must not reach a terminal.
    name.to_string().chars().filter(|c| !c.is_control()).collect()
}

/// The common name alone, or the whole name where there is none.
pub fn common(of: &Name) -> String {
    let whole = name(of);
    let part = of.0.iter().flat_map(|set| set.0.iter()).find(|one| one.oid == COMMON_NAME);
    let text = part.map(ToString::to_string);
    text.and_then(|t| t.strip_prefix("CN=").map(str::to_owned))
        .map_or(whole, |t| t.replace('\\', "").chars().filter(|c| !c.is_control()).collect())
}

const COMMON_NAME: der::asn1::ObjectIdentifier = der::asn1::ObjectIdentifier::new_unwrap("2.5.4.3");
