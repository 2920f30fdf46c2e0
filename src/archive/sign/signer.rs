//! Who signs: a private key and the certificate that belongs to it, from PEM or PKCS#12 files.

use der::Encode as _;
use p12_keystore::KeyStore;
use x509_cert::Certificate;
use zeroize::Zeroizing;

use super::Refused;
use super::certificate::{common, name, read};
use super::key::{NoKey, PrivateKey};
use super::moment::Moment;

/// What is asked for where a file is locked.
pub type Passphrase = Zeroizing<String>;

/// A private key with the certificates that go with it.
pub struct Signer {
    /// The key.
    pub(super) key: PrivateKey,
    /// The certificate of the key, then those that may help a reader to judge it.
    pub(super) certificates: Vec<Certificate>,
}

/// What a file holds.
#[derive(Default)]
struct Found {
    key: Option<PrivateKey>,
    certificates: Vec<Certificate>,
}

/// What to do about a key that is locked in an old way, or in none that is known here.
const CONVERT: &str =
    "Convert it once: openssl pkcs8 -topk8 -v2 aes-256-cbc -in OLD.pem -out NEW.pem; or name a PKCS#12 file.";
const KINDS: &str = "Sign with a key that is RSA of 2048 bits or more, or on the curve P-256 or P-384.";

impl Signer {
    /// From the bytes of a key file (PEM or PKCS#12) and, where it is a file of its own, of the certificate (PEM or DER).
    /// `ask` is called for the passphrase where the key is locked, once.
    ///
    /// # Errors
    /// [`Refused`] where there is no key or no certificate of it, where the passphrase does not open it, or where the key
    /// is of a kind that does not sign here.
    pub fn open(
        key: &[u8],
        certificate: Option<&[u8]>,
        ask: &mut dyn FnMut() -> Result<Passphrase, Refused>,
    ) -> Result<Self, Refused> {
        let mut found = if key.starts_with(&[0x30]) { pkcs12(key, ask)? } else { pem(key, ask)? };
        let apart = certificate.map(certificates).transpose()?.unwrap_or_default();
        found.certificates.extend(apart);
        let Some(key) = found.key else {
            return Err(Refused::key(
                "there is no private key in it",
                "Name the file with the private key, PEM or PKCS#12.",
            ));
        };
        if found.certificates.is_empty() {
            return Err(Refused::key(
                "there is no certificate with the key",
                "Name the certificate's file with --certificate, or a PKCS#12 file that holds both.",
            ));
        }
        let own = key.public();
        let belongs = |c: &Certificate| c.tbs_certificate.subject_public_key_info.to_der().ok() == own;
        let Some(at) = found.certificates.iter().position(belongs) else {
            return Err(Refused::certificate(
                format!(
                    "the certificate of {} does not belong to this key",
                    name(&found.certificates[0].tbs_certificate.subject)
                ),
                "Name the certificate that was issued for this key.",
            ));
        };
        found.certificates.swap(0, at);
        Ok(Self { key, certificates: found.certificates })
    }

    /// The signer's common name, as the certificate has it.
    pub fn name(&self) -> String {
        common(&self.certificates[0].tbs_certificate.subject)
    }

    /// Refuses a certificate that is not in force at a moment.
    pub(super) fn in_force(&self, at: Moment) -> Result<(), Refused> {
        let validity = &self.certificates[0].tbs_certificate.validity;
        let (from, to) = (validity.not_before, validity.not_after);
        if (from.to_unix_duration()..=to.to_unix_duration()).contains(&at.since_1970()) {
            return Ok(());
        }
        Err(Refused::certificate(
            format!("the certificate is in force from {from} to {to}, and not on {}", at.words()),
            "Sign with a certificate that is in force; a reader of the pack would not accept this one.",
        ))
    }
}

/// Certificates from a file of their own: PEM, any number, or one as DER.
fn certificates(bytes: &[u8]) -> Result<Vec<Certificate>, Refused> {
    const HELP: &str = "Name a certificate, X.509, as PEM or DER.";
    let blocks = match bytes.starts_with(&[0x30]) {
        true => vec![("CERTIFICATE".to_owned(), Zeroizing::new(bytes.to_vec()))],
        false => blocks(bytes).map_err(|what| Refused::certificate(what, HELP))?,
    };
    let of = |(label, der): &Block| (label == "CERTIFICATE").then(|| read(der));
    let found: Option<Vec<_>> = blocks.iter().filter_map(of).collect();
    match found {
        None => Err(Refused::certificate("a certificate in it is broken", HELP)),
        Some(none) if none.is_empty() => Err(Refused::certificate("there is no certificate in it", HELP)),
        Some(all) => Ok(all),
    }
}

/// One block of a PEM file: its label and its bytes.
type Block = (String, Zeroizing<Vec<u8>>);

/// The blocks of a PEM file: label and bytes. Words around them are passed over.
fn blocks(bytes: &[u8]) -> Result<Vec<Block>, String> {
    const BEGIN: &str = "-----BEGIN ";
    const NEITHER: &str = "it is neither a PEM nor a PKCS#12 file";
    let text = std::str::from_utf8(bytes).map_err(|_| NEITHER.to_owned())?;
    let mut out = Vec::new();
    let mut rest = text;
    while let Some(at) = rest.find(BEGIN) {
        let label = rest[at + BEGIN.len()..].split("-----").next().unwrap_or_default();
        let end = format!("-----END {label}-----");
        let broken = || format!("its part {label} is broken, or not whole");
        let to = at + rest[at..].find(&end).ok_or_else(broken)? + end.len();
        let block = &rest[at..to];
        if block.contains("Proc-Type:") {
            return Err(format!("its part {label} is locked in an old way that is not safe any more"));
        }
        let (_, der) = der::pem::decode_vec(block.as_bytes()).map_err(|_| broken())?;
        out.push((label.to_owned(), Zeroizing::new(der)));
        rest = &rest[to..];
    }
    if out.is_empty() { Err(NEITHER.to_owned()) } else { Ok(out) }
}

fn pem(bytes: &[u8], ask: &mut dyn FnMut() -> Result<Passphrase, Refused>) -> Result<Found, Refused> {
    let mut found = Found::default();
    for (label, der) in blocks(bytes).map_err(|what| Refused::key(what, CONVERT))? {
        let key = match label.as_str() {
            "PRIVATE KEY" => PrivateKey::from_pkcs8(&der),
            "RSA PRIVATE KEY" => PrivateKey::from_pkcs1(&der),
            "EC PRIVATE KEY" => PrivateKey::from_sec1(&der),
            "ENCRYPTED PRIVATE KEY" => PrivateKey::from_pkcs8(unlocked(&der, &ask()?)?.as_bytes()),
            "CERTIFICATE" => {
                let broken =
                    || Refused::key("a certificate in it is broken", "Take a whole copy of the file.");
                found.certificates.push(read(&der).ok_or_else(broken)?);
                continue;
            }
            _ => continue,
        };
        let key = key.map_err(no_key)?;
        if found.key.replace(key).is_some() {
            return Err(Refused::key(
                "there is more than one private key in it",
                "Name a file with the one key to sign with.",
            ));
        }
    }
    Ok(found)
}

/// The key inside `ENCRYPTED PRIVATE KEY`.
fn unlocked(der: &[u8], passphrase: &Passphrase) -> Result<pkcs8::SecretDocument, Refused> {
    let locked = pkcs8::EncryptedPrivateKeyInfoRef::try_from(der)
        .map_err(|_| Refused::key("its key is locked in a way that is not known here, or broken", CONVERT))?;
    if locked.encryption_algorithm.pbes2().is_none() {
        return Err(Refused::key("its key is locked in an old way that is not safe any more", CONVERT));
    }
    locked.decrypt(passphrase.as_bytes()).map_err(|_| wrong())
}

fn pkcs12(bytes: &[u8], ask: &mut dyn FnMut() -> Result<Passphrase, Refused>) -> Result<Found, Refused> {
    use p12_keystore::error::Error;
    let passphrase = ask()?;
    let store = KeyStore::from_pkcs12(bytes, &passphrase).map_err(|why| match why {
        Error::MacError(_) | Error::Pkcs5Error(_) | Error::UnpadError => wrong(),
        other => Refused::key(
            format!("it does not read as PKCS#12: {other}"),
            "Take a whole copy of the file; or save it again with AES-256, as openssl pkcs12 -export does.",
        ),
    })?;
    let Some((_, chain)) = store.private_key_chain() else {
        return Ok(Found::default());
    };
    let key = PrivateKey::from_pkcs8(chain.key()).map_err(no_key)?;
    let certificates: Option<Vec<_>> = chain.chain().iter().map(|c| read(c.as_der())).collect();
    let broken = || Refused::key("a certificate in it is broken", "Take a whole copy of the file.");
    Ok(Found { key: Some(key), certificates: certificates.ok_or_else(broken)? })
}

fn wrong() -> Refused {
    Refused::key(
        "the passphrase does not open it",
        "Type the passphrase of this file again; nothing was written.",
    )
}

fn no_key(why: NoKey) -> Refused {
    match why {
        NoKey::Broken => Refused::key("its private key is broken", "Take a whole copy of the file."),
        NoKey::Kind(kind) => {
            Refused::key(format!("its key is of a kind that does not sign here: {kind}"), KINDS)
        }
    }
}
